import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { People, choose, faults, goTo, heading } from './support/browser.js';

let people: People;
beforeAll(async () => { people = await People.start(); });
afterAll(async () => {
  await people.stop();
  expect(faults).toEqual([]);
});

/** Through the page's own session: what a schedule of the trade's size would take minutes to type. */
const post = (page: Page, path: string, body: unknown, method = 'POST'): Promise<{ status: number; body: Record<string, string> }> =>
  page.evaluate(async ([at, sent, verb]) => {
    const answer = await fetch(String(at), { method: String(verb), headers: { 'content-type': 'application/json' }, body: JSON.stringify(sent) });
    return { status: answer.status, body: (await answer.json()) as Record<string, string> };
  }, [path, body, method] as const);

describe('numbers that others change', () => {
  it('are there without loading the page again, with a word about who changed them', async () => {
    const fireEngineer = await people.person('Fire engineer');
    const structuralEngineer = await people.person('Structural engineer');
    await goTo(structuralEngineer, 'Zones');
    const row = structuralEngineer.getByRole('row', { name: /Z09/ });
    await row.waitFor();
    const before = await row.textContent();
    await structuralEngineer.evaluate(() => { (window as unknown as { stays: boolean }).stays = true; });
    await goTo(fireEngineer, 'Zones');
    const edit = fireEngineer.getByRole('button', { name: 'Edit zone Z09' });
    await edit.click();
    const longer = (before ?? '').includes('R 120') ? '90 minutes' : '120 minutes';
    await choose(fireEngineer, fireEngineer.getByRole('dialog'), 'Period', longer);
    await fireEngineer.getByRole('dialog').getByRole('button', { name: 'Save' }).click();
    await fireEngineer.getByRole('dialog').waitFor({ state: 'hidden' });
    await row.getByText(`R ${longer.split(' ')[0]}`).filter({ visible: true }).first().waitFor();
    await structuralEngineer.getByText(/changed zone Z09 .*, a moment ago/).waitFor();
    // one's own changes are not told
    expect(await fireEngineer.getByText(/a moment ago/).count()).toBe(0);
    expect(await structuralEngineer.evaluate(() => (window as unknown as { stays?: boolean }).stays)).toBe(true);
  });

  it('that are many are recalculated by a worker, in sight, and nothing old is shown meanwhile', async () => {
    const page = await people.person('Specifier');
    const projectId = /projects\/([0-9a-f-]+)/.exec(page.url())?.[1] ?? '';
    await goTo(page, 'Members');
    await heading(page).waitFor();
    const line = page.getByText(/(Recalculating|to be recalculated)/).first();
    // asked for again and again until it is seen: a building of this size is recalculated in the blink of an eye
    let seen = false;
    for (let attempt = 0; attempt < 60 && !seen; attempt += 1) {
      const asked = await post(page, `/api/projects/${projectId}/recalculate`, {});
      expect(asked.status).toBe(200);
      // the journeys' server leaves anything above three hundred members to its worker
      expect(asked.body['queued']).toBe(true);
      seen = await line.isVisible();
    }
    expect(seen).toBe(true);
    await line.waitFor({ state: 'hidden', timeout: 60_000 });
    await expect.poll(() => page.getByText('being recalculated').count(), { timeout: 15_000 }).toBe(0);
    await goTo(page, 'Schedule');
    await expect.poll(() => page.getByText(/older than the inputs|being recalculated/).count(), { timeout: 15_000 }).toBe(0);
  });
});
