import { createHash } from 'node:crypto';
import { readFile } from 'node:fs/promises';
import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { People, choose, faults, goTo, heading, openMember } from './support/browser.js';

let people: People;
let fireEngineer: Page;
let structuralEngineer: Page;
let specifier: Page;
let checker: Page;
let contractor: Page;
let digest: string;
beforeAll(async () => { people = await People.start(); });
afterAll(async () => {
  await people.stop();
  expect(faults).toEqual([]);
});

/** Actions of a simply supported trimmer: 4.6 and 5.0 kN/m² on 2.5 m over 4 m, much rounded. Invented. */
async function giveActions(page: Page, mark: string): Promise<void> {
  await openMember(page, mark);
  await heading(page).filter({ hasText: 'Not determined' }).waitFor();
  await page.getByRole('button', { name: 'Critical temperature' }).click();
  const drawer = page.getByRole('dialog');
  await choose(page, drawer, 'How it comes about', 'Calculated from actions');
  const permanent = drawer.getByRole('group', { name: 'Permanent action, characteristic' });
  await permanent.getByLabel('Moment My').fill('23');
  await permanent.getByLabel('Shear Vz').fill('23');
  const leading = drawer.getByRole('group', { name: 'Leading variable action, characteristic' });
  await leading.getByLabel('There is a variable action').check();
  await choose(page, leading, 'Category', 'E storage');
  await leading.getByLabel('Moment My').fill('25');
  await leading.getByLabel('Shear Vz').fill('25');
  await drawer.getByRole('radio', { name: 'Held along its length' }).check();
  await drawer.getByLabel('Reference').fill('Calculation L4/openings, sheet 3 (invented)');
  await drawer.getByRole('button', { name: 'Save' }).click();
  await heading(page).filter({ hasText: /Needs [\d.\s]+[µm]m/ }).waitFor();
}

async function confirmStep(page: Page, button: string, inDialog: string): Promise<void> {
  await page.getByRole('button', { name: button, exact: true }).click();
  await page.getByRole('dialog').getByRole('button', { name: inDialog, exact: true }).click();
  await page.getByRole('dialog').waitFor({ state: 'hidden' });
}

describe('from open items to the issued schedule', () => {
  it('the fire engineer lengthens a zone’s period, and its target follows', async () => {
    fireEngineer = await people.person('Fire engineer');
    await goTo(fireEngineer, 'Zones');
    const page = fireEngineer;
    await page.getByRole('button', { name: 'Target of Z07' }).click();
    const target = page.getByRole('cell', { name: /needs/ });
    const needs = async (): Promise<number> => Number(/needs (\d+\.\d+)\s*mm/.exec((await target.textContent()) ?? '')?.[1]);
    await target.waitFor();
    const before = await needs();
    expect(before).toBeGreaterThan(0.3);
    await page.getByRole('button', { name: 'Edit zone Z07' }).click();
    await choose(page, page.getByRole('dialog'), 'Period', '90 minutes');
    await page.getByRole('dialog').getByRole('button', { name: 'Save' }).click();
    await page.getByRole('dialog').waitFor({ state: 'hidden' });
    await page.getByRole('row', { name: /Z07 Quiet floor/ }).getByText('R 90').filter({ visible: true }).first().waitFor();
    await expect.poll(needs, { timeout: 15_000 }).toBeGreaterThan(before * 1.2);
  });

  it('the fire engineer accepts the assumed temperatures', async () => {
    for (const mark of ['L5-C08', 'L5-C09']) {
      await openMember(fireEngineer, mark);
      await fireEngineer.getByRole('button', { name: 'Accept' }).click();
      const drawer = fireEngineer.getByRole('dialog');
      await drawer.getByLabel('Reason').fill('Lightly loaded screen column; to be confirmed by calculation (invented)');
      await drawer.getByRole('button', { name: 'Accept for 1 member' }).click();
      await drawer.waitFor({ state: 'hidden' });
    }
  });

  it('the structural engineer gives members their actions', async () => {
    structuralEngineer = await people.person('Structural engineer');
    for (const mark of ['L4-PB14', 'L4-PB15', 'L4-PB16']) await giveActions(structuralEngineer, mark);
  });

  it('the specifier brings in corrected steel: upload, columns, preview, confirm', async () => {
    specifier = await people.person('Specifier');
    await goTo(specifier, 'Members');
    await specifier.getByRole('link', { name: 'Import members' }).click();
    // one header that nobody could guess
    const csv = 'Mark;What it is made of;Remarks\nL3-PB04;UB 457x191x74;Depth found for the duct\nL4-BR06;L 100x100x10;Within the assessment\n';
    await specifier.locator('input[type=file]').setInputFiles({ name: 'corrected-steel.csv', mimeType: 'text/csv', buffer: Buffer.from(csv) });
    await heading(specifier).filter({ hasText: 'corrected-steel.csv' }).waitFor();
    await choose(specifier, specifier, /Column B/, 'Section');
    await specifier.getByRole('button', { name: 'Check the rows' }).click();
    await heading(specifier).filter({ hasText: '2 rows can be brought in: 2 changed' }).waitFor();
    await specifier.getByText('UB 356x171x45').waitFor();
    await specifier.getByRole('button', { name: 'Write 2 members' }).click();
    await heading(specifier).filter({ hasText: '2 changed' }).waitFor();
    await openMember(specifier, 'L3-PB04');
    await heading(specifier).filter({ hasText: /Needs [\d.\s]+[µm]m/ }).waitFor();
  });

  it('the specifier finds nothing in the way and prepares, but cannot check that', async () => {
    await goTo(specifier, 'Schedule');
    await heading(specifier).filter({ hasText: 'P02 can be prepared' }).waitFor();
    await confirmStep(specifier, 'Prepare', 'Prepare');
    await heading(specifier).filter({ hasText: 'P02 is prepared and waits for its check' }).waitFor();
    await specifier.getByText('You prepared P02 yourself.').waitFor();
    expect(await specifier.getByRole('button', { name: 'Sign as checked' }).isDisabled()).toBe(true);
  });

  it('the contractor still reads P01, and no draft', async () => {
    contractor = await people.person('Contractor');
    await heading(contractor).filter({ hasText: 'P01' }).waitFor();
    const project = new URL(contractor.url()).pathname.split('/').slice(0, 3).join('/');
    await contractor.goto(`${project}/members`);
    await contractor.getByText('Not yours to see').waitFor();
    const refused = await contractor.request.get(`/api${project}/members`);
    expect(refused.status()).toBe(403);
    await contractor.goto(`${project}/schedule`);
    await contractor.getByRole('link', { name: 'P01', exact: true }).waitFor();
    expect(await contractor.getByRole('link', { name: 'P02', exact: true }).count()).toBe(0);
  });

  it('the second specifier checks and issues', async () => {
    checker = await people.person('Specifier, checks');
    await goTo(checker, 'Schedule');
    await confirmStep(checker, 'Sign as checked', 'Sign as checked');
    await heading(checker).filter({ hasText: 'P02 is checked and waits to be issued' }).waitFor();
    await confirmStep(checker, 'Issue', 'Issue');
    await heading(checker).filter({ hasText: 'P02 is issued' }).waitFor();
    await checker.getByRole('row', { name: /P01/ }).getByText('Superseded').waitFor();
  });

  it('the PDF that anybody downloads has the digest shown', async () => {
    await checker.getByRole('link', { name: 'P02', exact: true }).click();
    await heading(checker).filter({ hasText: 'P02 is issued' }).waitFor();
    const [download] = await Promise.all([checker.waitForEvent('download'), checker.getByRole('link', { name: 'Download', exact: true }).click()]);
    expect(download.suggestedFilename()).toBe('26-114-protection-schedule-P02.pdf');
    const content = await readFile(await download.path());
    expect(content.subarray(0, 5).toString()).toBe('%PDF-');
    digest = createHash('sha256').update(content).digest('hex');
    await checker.locator('dd').and(checker.getByTitle(digest)).waitFor();
    await checker.getByRole('button', { name: 'Verify' }).click();
    await checker.getByText('The frozen schedule and the PDF both match their digests.').waitFor();
  });

  it('the contractor reads the new revision floor by floor, with its quantities', async () => {
    await goTo(contractor, 'Site');
    await contractor.reload();
    await heading(contractor).filter({ hasText: 'P02' }).waitFor();
    await contractor.getByTitle(digest).waitFor();
    await contractor.getByRole('table', { name: 'To buy for the whole job' }).getByText('Demo Coat W').waitFor();
    await choose(contractor, contractor, 'Floor', /^L3 Third floor/);
    await contractor.getByRole('table', { name: 'Materials for L3' }).waitFor();
    await contractor.getByRole('row', { name: /L3-PB04/ }).getByText('UB 457x191x74').waitFor();
    expect(await contractor.getByRole('row', { name: /L2-PB01/ }).count()).toBe(0);
  });
});
