import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { People, faults, goTo, openMember } from './support/browser.js';

/** The rules of WCAG 2.2 A and AA that axe-core checks, without its experimental one on names that differ from what is seen. */
const rules = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];
const axe = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');
interface Axe { run: (context: unknown, options: unknown) => Promise<{ violations: { id: string; help: string; nodes: { target: unknown[]; failureSummary?: string }[] }[] }> }

async function violations(page: Page): Promise<string[]> {
  // the page's own policy refuses an added script element; evaluating is not one
  await page.evaluate(axe);
  const found = await page.evaluate(
    async (tags) => (await (globalThis as unknown as { axe: Axe }).axe.run(document, { runOnly: { type: 'tag', values: tags }, rules: { 'label-content-name-mismatch': { enabled: false } } })).violations,
    rules,
  );
  return found.map((v) => `${v.id}: ${v.help} (${v.nodes.length}), first at ${String(v.nodes[0]?.target)}: ${v.nodes[0]?.failureSummary ?? ''}`);
}

let people: People;
beforeAll(async () => { people = await People.start(); });
afterAll(async () => {
  await people.stop();
  expect(faults).toEqual([]);
});

describe.each([['light', false], ['dark', true]] as const)('on a %s ground', (ground, dark) => {
  let page: Page;
  beforeAll(async () => { page = await people.person('Specifier', { dark }); });

  it('the ground is as the system asks', async () => {
    const paper = await page.evaluate(() => getComputedStyle(document.documentElement).getPropertyValue('--paper').trim().toUpperCase());
    expect(paper).toBe(ground === 'dark' ? '#121718' : '#F5F1E6');
  });

  it.each(['Building', 'Zones', 'Members', 'Products', 'Quantities', 'Schedule', 'Site', 'Team and basis'])('%s has no fault that axe finds', async (name) => {
    await goTo(page, name);
    await page.waitForLoadState('networkidle');
    expect(await violations(page)).toEqual([]);
  });

  it('the projects page has none', async () => {
    await page.goto('/projects');
    await page.locator('.mt-project svg.mt-drawing').waitFor();
    expect(await violations(page)).toEqual([]);
    await page.goBack();
  });

  it('the building as issued, for those who see nothing else, has none', async () => {
    const contractor = await people.person('Contractor', { dark });
    await goTo(contractor, 'Building');
    await contractor.getByRole('region', { name: 'Elevation' }).waitFor();
    expect(await violations(contractor)).toEqual([]);
  });

  it('a member’s sheet has none', async () => {
    await openMember(page, 'L0-TB01');
    await page.waitForLoadState('networkidle');
    expect(await violations(page)).toEqual([]);
  });
});

it('the sign-in page has none', async () => {
  const page = await people.visitor();
  await page.goto('/');
  await page.getByRole('button', { name: 'Sign in' }).waitFor();
  expect(await violations(page)).toEqual([]);
});
