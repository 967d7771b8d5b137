import { screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it } from 'vitest';
import type { OpenItemDto, ReadinessDto, RevisionDto } from '@mantlet/common';
import { projectId, renderPage, serve, testProject } from '../../test/render.js';
import SchedulePage from './pages/schedule-page.js';
import { groupByRole, nextStep, roleTally, scheduleWords, verificationWords } from './revision-words.js';

const revision = (more: Partial<RevisionDto> = {}): RevisionDto => ({
  id: 'r1', code: 'P01', purpose: '', state: 'draft', createdAt: '2026-05-01T08:00:00Z', prepared: null, checked: null, issued: null, returnedComment: null,
  snapshotSha256: null, pdfSha256: null, pdfBytes: null, members: null, protectedAreaM2: null, ...more,
});
const item = (more: Partial<OpenItemDto> = {}): OpenItemDto => ({ role: 'structural-engineer', kind: 'blocker', code: 'no-actions', title: '3 beams have no actions', zoneId: 'z1', zoneLabel: 'Z01 Hall', memberIds: ['m1'], count: 3, page: 'member', ...more });
const ready: ReadinessDto = { ready: true, current: true, blockers: [], warnings: [] };
const blocked: ReadinessDto = { ready: false, current: true, blockers: [item(), item({ role: 'specifier', title: 'Z02 has no system', page: 'zones' })], warnings: [item({ kind: 'warning', title: 'Above 650 °C' })] };
const signed = (name: string, userId = name) => ({ userId, name, at: '2026-05-02T08:00:00Z' });

describe('the next step', () => {
  it('is offered to a specifier when nothing blocks', () => expect(nextStep(revision(), ['specifier'], 'Ada', ready)).toEqual({ step: 'prepare', text: 'Prepare', why: null }));
  it('says what keeps it from being taken', () => {
    expect(nextStep(revision(), ['specifier'], 'Ada', blocked)?.why).toMatch(/^Two items keep it/);
    expect(nextStep(revision(), ['fire-engineer'], 'Ada', ready)?.why).toBe('Only the specifier may prepare, check and issue revisions.');
  });
  it('lets another specifier check, not the one who prepared', () => {
    const prepared = revision({ state: 'prepared', prepared: signed('Ada') });
    expect(nextStep(prepared, ['specifier'], 'Ada', ready)?.why).toMatch(/^You prepared P01 yourself/);
    expect(nextStep(prepared, ['specifier'], 'Ben', ready)).toMatchObject({ step: 'check', why: null });
  });
  it('tells two people of one name apart', () => {
    const prepared = revision({ state: 'prepared', prepared: signed('Ada Quill', 'u1') });
    expect(nextStep(prepared, ['specifier'], 'u1', ready)?.why).toMatch(/yourself/);
    expect(nextStep(prepared, ['specifier'], 'u2', ready)?.why).toBeNull();
  });
  it('ends with issue', () => {
    expect(nextStep(revision({ state: 'checked' }), ['specifier'], 'Ada', ready)).toMatchObject({ step: 'issue', why: null });
    expect(nextStep(revision({ state: 'issued' }), ['specifier'], 'Ada', ready)).toBeNull();
  });
});

describe('the schedule in words', () => {
  it('answers what the draft waits for', () => {
    expect(scheduleWords([revision()], blocked).heading).toBe('Two items keep P01 from being prepared');
    expect(scheduleWords([revision()], ready)).toEqual({ heading: 'P01 can be prepared', sub: 'Nothing has been issued yet.' });
    expect(scheduleWords([revision({ state: 'issued', issued: signed('Ben') })], ready).heading).toBe('P01 is issued, 2 May 2026');
    expect(scheduleWords([], undefined).heading).toBe('No revision yet');
  });
  it('tells those who see issued work only what it is to them, and nothing of work that they cannot see', () => {
    const issued = [revision({ state: 'issued', issued: signed('Ben') })];
    expect(scheduleWords(issued, undefined, ['contractor']).sub).toMatch(/^Apply what this revision says/);
    expect(scheduleWords(issued, undefined, ['inspector', 'reader']).sub).toMatch(/^Inspect against this revision/);
    expect(scheduleWords(issued, undefined, ['reader']).sub).toMatch(/^This is the revision in force/);
    expect(scheduleWords(issued, ready, ['specifier']).sub).toMatch(/^No revision is in work/);
  });
  it('groups by who must act, blockers first', () => {
    const groups = groupByRole(blocked);
    expect(groups.map(roleTally)).toEqual(['Structural engineer: 1 blocker, 1 worth a look', 'Specifier: 1 blocker']);
    expect(groups[0]?.items.map((i) => i.kind)).toEqual(['blocker', 'warning']);
  });
  it('says whether what is stored is what was signed', () => {
    expect(verificationWords({ pdfMatches: true, snapshotMatches: true }).kind).toBe('settled');
    expect(verificationWords({ pdfMatches: false, snapshotMatches: true })).toMatchObject({ kind: 'attention', text: expect.stringMatching(/the PDF differs/) });
    expect(verificationWords({ pdfMatches: null, snapshotMatches: null }).kind).toBe('neutral');
  });
});

describe('the schedule page', () => {
  const at = `/projects/${projectId}`;
  const session = { 'GET /session': { body: { user: { id: 'u', name: 'Ben', email: 'b@x.test', administrator: false }, needsSetUp: false } } };
  it('leads each blocker to its place and keeps Prepare shut', async () => {
    serve({ ...session, [`GET ${at}/revisions`]: { body: [revision()] }, [`GET ${at}/readiness`]: { body: blocked } });
    renderPage(<SchedulePage />, { project: testProject(['specifier']) });
    expect(await screen.findByRole('heading', { level: 1, name: 'Two items keep P01 from being prepared' })).toBeInTheDocument();
    expect(screen.getByRole('link', { name: '3 beams have no actions' })).toHaveAttribute('href', `${at}/members/m1`);
    expect(screen.getByRole('button', { name: 'Prepare' })).toBeDisabled();
  });
  it('asks in words before issuing, then sends it', async () => {
    const calls = serve({ ...session, [`GET ${at}/revisions`]: { body: [revision({ state: 'checked', prepared: signed('Ada'), checked: signed('Ben') })] }, [`GET ${at}/readiness`]: { body: ready }, [`POST ${at}/revisions/r1/issue`]: { body: revision({ state: 'issued' }) } });
    renderPage(<SchedulePage />, { project: testProject(['specifier']) });
    await userEvent.click(await screen.findByRole('button', { name: 'Issue' }));
    expect(await screen.findByText(/cannot be changed afterwards, nor taken back/)).toBeInTheDocument();
    expect(calls.some((c) => c.method === 'POST')).toBe(false);
    const buttons = screen.getAllByRole('button', { name: 'Issue' });
    await userEvent.click(buttons[buttons.length - 1] as HTMLElement);
    await waitFor(() => expect(calls.some((c) => c.method === 'POST' && c.path === `${at}/revisions/r1/issue`)).toBe(true));
  });
  it('asks nothing of work in progress for a contractor, and says from whom it is awaited', async () => {
    const team = [{ userId: 'a', name: 'Ada', email: 'a@x.test', roles: ['specifier'] }, { userId: 'b', name: 'Ben', email: 'b@x.test', roles: ['fire-engineer', 'specifier'] }, { userId: 'c', name: 'Cy', email: 'c@x.test', roles: ['reader'] }];
    const calls = serve({ ...session, [`GET ${at}/revisions`]: { body: [] }, [`GET ${at}/memberships`]: { body: team } });
    renderPage(<SchedulePage />, { project: testProject(['contractor']) });
    expect(await screen.findByText(/Revisions appear here once a specifier issues the schedule/)).toBeInTheDocument();
    expect(await screen.findByText(/It is awaited from Ada and Ben\./)).toBeInTheDocument();
    expect(calls.some((c) => c.path.endsWith('/readiness'))).toBe(false);
    expect(screen.queryByRole('button')).toBeNull();
  });
});
