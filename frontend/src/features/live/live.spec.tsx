import { QueryClientProvider } from '@tanstack/react-query';
import { act, render, screen } from '@testing-library/react';
import { liveTopics } from '@mantlet/common';
import type { JobDto, LiveTopic, ProjectEventDto } from '@mantlet/common';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { createQueryClient, projectKey } from '../../lib/query-client.js';
import { percentOf, sayJob } from './job-words.js';
import { LiveNotice } from './components/live-notice.js';
import { queriesTouched } from './live-queries.js';
import { useLiveProject } from './use-live-project.js';

const projectId = '11111111-1111-4111-8111-111111111111';
const me = '22222222-2222-4222-8222-222222222222';
const other = '33333333-3333-4333-8333-333333333333';

/** The browser's own class, driven by the test. */
class FakeSource extends EventTarget {
  static all: FakeSource[] = [];
  onerror: (() => void) | null = null;
  closed = false;
  constructor(readonly url: string) { super(); FakeSource.all.push(this); }
  close() { this.closed = true; }
  say(type: string, data: unknown = {}) { act(() => { this.dispatchEvent(new MessageEvent(type, { data: JSON.stringify(data) })); }); }
  fail() { act(() => this.onerror?.()); }
}
const latest = () => FakeSource.all.at(-1) as FakeSource;
const change = (topics: LiveTopic[], by: string, text: string | null): ProjectEventDto =>
  ({ topics, entityIds: [], by: { id: by, name: 'Tamsin Emberley' }, at: '2026-12-01T10:00:00.000Z', text });

function Page() { return <LiveNotice {...useLiveProject(projectId, me)} />; }
function start() {
  const client = createQueryClient();
  for (const name of ['self', 'zones', 'members', 'memberships', 'building']) client.setQueryData(projectKey(projectId, name), name);
  client.setQueryData(projectKey('another', 'zones'), 'zones');
  const view = render(<QueryClientProvider client={client}><Page /></QueryClientProvider>);
  const old = () => client.getQueryCache().getAll().filter((query) => query.state.isInvalidated).map((query) => query.queryKey.slice(1).join(' '));
  return { client, old, ...view };
}
const wait = (milliseconds: number) => act(() => vi.advanceTimersByTimeAsync(milliseconds));

describe('a page that follows its project', () => {
  beforeEach(() => { FakeSource.all = []; vi.useFakeTimers(); vi.stubGlobal('EventSource', FakeSource); });
  afterEach(() => { vi.useRealTimers(); vi.unstubAllGlobals(); });

  it('asks again for what a change touched, and for nothing else', async () => {
    const { old } = start();
    expect(latest().url).toBe(`/api/projects/${projectId}/events`);
    latest().say('ready', { missed: false });
    expect(old()).toEqual([]);
    latest().say('change', change(['team'], other, 'Tamsin Emberley added Petra to the team'));
    await wait(200);
    expect(old()).toEqual([`${projectId} self`, `${projectId} memberships`]);
  });

  it('tells what others did for a while, and nothing of what one did oneself', async () => {
    const { old } = start();
    latest().say('ready', { missed: false });
    latest().say('change', change(['zones'], me, 'I changed zone Z01'));
    expect(screen.queryByText(/zone Z01/)).toBeNull();
    await wait(200);
    // another window of one's own may show it
    expect(old()).toContain(`${projectId} zones`);
    latest().say('change', change(['zones'], other, 'Tamsin Emberley changed zone Z03'));
    expect(screen.getByText('Tamsin Emberley changed zone Z03, a moment ago')).toBeTruthy();
    await wait(9000);
    expect(screen.queryByText(/zone Z03/)).toBeNull();
  });

  it('leaves asking to a save that is under way here', async () => {
    const { client, old } = start();
    latest().say('ready', { missed: false });
    let answer: () => void = () => undefined;
    void client.getMutationCache().build(client, { mutationFn: () => new Promise<void>((resolve) => { answer = resolve; }) }).execute(undefined);
    latest().say('change', change(['zones'], me, null));
    await wait(200);
    expect(old()).toEqual([]);
    answer();
  });

  it('reads everything again when it was away, and when something was missed at the start', async () => {
    const { old } = start();
    latest().say('ready', { missed: true });
    expect(old()).toHaveLength(5);
    expect(old()).not.toContain('another zones');
  });

  it('says after a few seconds that it is not live, tries again, and reads everything when it is back', async () => {
    const { client, old } = start();
    latest().say('ready', { missed: false });
    latest().fail();
    expect(screen.queryByText(/Not live/)).toBeNull();
    await wait(1000);
    expect(FakeSource.all).toHaveLength(2);
    latest().fail();
    await wait(3500);
    expect(screen.getByText(/^Not live: figures may be older than a minute/)).toBeTruthy();
    for (const name of ['self', 'zones', 'members']) client.setQueryData(projectKey(projectId, name), name);
    latest().say('ready', { missed: false });
    expect(screen.queryByText(/Not live/)).toBeNull();
    expect(old()).toContain(`${projectId} members`);
    expect(FakeSource.all.slice(0, -1).every((source) => source.closed)).toBe(true);
  });

  it('polls while it is not live', async () => {
    const { old } = start();
    latest().fail();
    await wait(59_000);
    expect(old()).not.toContain(`${projectId} zones`);
    await wait(2000);
    expect(old()).toContain(`${projectId} zones`);
  });

  it('asks whether it may still be here when the server says goodbye', () => {
    const { old } = start();
    latest().say('ready', { missed: false });
    latest().say('closed');
    expect(old()).toEqual([`${projectId} self`]);
  });

  it('lets the connection go when the page is left', () => {
    const { unmount } = start();
    unmount();
    expect(latest().closed).toBe(true);
  });

  it('knows for every topic what shows it', () => {
    for (const topic of liveTopics) expect(queriesTouched([topic]).length).toBeGreaterThan(0);
    expect(queriesTouched(['results'])).toEqual(expect.arrayContaining(['building', 'zones', 'members', 'member', 'quantities', 'readiness']));
  });
});

describe('what is said of a recalculation', () => {
  const job: JobDto = { id: projectId, kind: 'recalculation', state: 'running', total: 12_000, done: 4800, secondsLeft: 42, withoutWorker: false, error: null };
  it('how far it is, and what it means for what is shown', () => {
    expect(sayJob(job)).toMatch(/^Recalculating 12.000 members: 40 %, about 50 s left\. Their results and all totals are open until then\.$/);
    expect(sayJob({ ...job, secondsLeft: null })).toMatch(/40 %\. Their/);
    expect(sayJob({ ...job, secondsLeft: 150 })).toContain('about 3 min left');
  });
  it('that it waits, and that it waits for nobody', () => {
    expect(sayJob({ ...job, state: 'waiting', done: 0, secondsLeft: null })).toMatch(/^12.000 members wait to be recalculated\. /);
    expect(sayJob({ ...job, withoutWorker: true })).toMatch(/^7.200 members wait to be recalculated: no worker is running/);
    expect(sayJob({ ...job, state: 'waiting', total: 1, done: 0 })).toMatch(/^1 member waits/);
  });
  it('why it failed', () => {
    expect(sayJob({ ...job, state: 'failed', error: 'It failed. Try again.' })).toBe('It failed. Try again.');
  });
  it('is never at its end while something is left', () => {
    expect(percentOf({ ...job, done: 11_999 })).toBe(99);
    expect(percentOf({ ...job, total: 0, done: 0 })).toBe(0);
  });
});
