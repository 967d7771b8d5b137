import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { People, account, choose, faults, goTo, heading, openMember, settled, signIn, signOut } from './support/browser.js';

let people: People;
beforeAll(async () => { people = await People.start(); });
afterAll(async () => {
  await people.stop();
  expect(faults).toEqual([]);
});

const projectOf = (page: Page): string => /\/projects\/[0-9a-f-]+/.exec(page.url())?.[0] ?? '';
const pagesOf = async (page: Page): Promise<string[]> =>
  (await page.getByRole('navigation', { name: 'Pages' }).locator('a > span:first-child').allTextContents()).filter((name) => !['All projects', 'Help'].includes(name));
/** Buttons of the page itself, by what they are called to those who do not see them. */
const buttons = (page: Page): Promise<string[]> =>
  page.locator('main').getByRole('button').evaluateAll((all) => all.map((one) => one.getAttribute('aria-label') ?? one.textContent ?? ''));
const answer = async (page: Page, path: string, body?: unknown, method = 'PUT'): Promise<number> =>
  (await page.request.fetch(`/api${projectOf(page)}${path}`, body === undefined ? {} : { method, data: body })).status();
async function leave(page: Page): Promise<void> {
  const at = page.url();
  await signOut(page);
  // going back shows nothing of what was there
  await page.goto(at);
  await page.getByRole('button', { name: 'Sign in' }).waitFor();
  await page.context().close();
}

const allPages = ['Building', 'Zones', 'Members', 'Products', 'Quantities', 'Schedule', 'Site', 'Team and basis'];
const issuedPages = ['Building', 'Site', 'Schedule'];

describe('from sign-in to sign-out', () => {
  it('the fire engineer decides periods and basis, and no critical temperature', async () => {
    const page = await people.person('Fire engineer');
    expect(await pagesOf(page)).toEqual(allPages);
    await goTo(page, 'Zones');
    await page.getByRole('button', { name: 'Edit zone Z11' }).click();
    await page.getByRole('dialog').getByLabel('Reference').fill('Fire strategy FS-114, section 6.2 (invented)');
    await page.getByRole('dialog').getByRole('button', { name: 'Save' }).click();
    await page.getByRole('dialog').waitFor({ state: 'hidden' });
    expect((await buttons(page)).filter((name) => name.startsWith('Protection of'))).toEqual([]);
    await openMember(page, 'L0-TB01');
    const offered = await buttons(page);
    expect(offered).toContain('Accept');
    for (const name of ['Critical temperature', 'Change member', 'Delete']) expect(offered).not.toContain(name);
    const member = page.url().split('/members/')[1]?.split('?')[0] ?? '';
    expect(await answer(page, `/members/${member}/structural`, { version: 1, basis: { way: 'declared', temperatureC: 800, reference: 'mine' } })).toBe(403);
    await goTo(page, 'Team and basis');
    expect(await page.getByRole('region', { name: 'Design basis' }).getByLabel('γG').isEnabled()).toBe(true);
    await goTo(page, 'Schedule');
    for (const name of ['Prepare', 'Start the next revision', 'Sign as checked', 'Issue']) expect(await buttons(page)).not.toContain(name);
    await leave(page);
  });

  it('the structural engineer declares temperatures, and no period', async () => {
    const page = await people.person('Structural engineer');
    expect(await pagesOf(page)).toEqual(allPages);
    await openMember(page, 'L1-SB02');
    expect(await buttons(page)).not.toContain('Change member');
    await page.getByRole('button', { name: 'Critical temperature' }).click();
    const drawer = page.getByRole('dialog');
    await choose(page, drawer, 'How it comes about', 'Declared');
    await drawer.getByLabel('Critical temperature').fill('562');
    await drawer.getByLabel('Reference').fill('');
    await drawer.getByRole('button', { name: 'Save' }).click();
    // what is declared needs to be found again by others
    await drawer.locator('.mt-field-error').filter({ hasText: /say where the value comes from/i }).waitFor();
    await drawer.getByLabel('Reference').fill('Calculation L1/7, sheet 2 (invented)');
    await drawer.getByRole('button', { name: 'Save' }).click();
    await drawer.waitFor({ state: 'hidden' });
    await page.getByText(/562\s°C/).first().waitFor();
    await goTo(page, 'Zones');
    expect((await buttons(page)).filter((name) => /^(Edit|Add|Protection)/.test(name))).toEqual([]);
    const zones = (await (await page.request.get(`/api${projectOf(page)}/zones`)).json()) as { id: string }[];
    expect(await answer(page, `/zones/${zones[0]?.id}`, { version: 1, periodMin: 30 }, 'PATCH')).toBe(403);
    await goTo(page, 'Team and basis');
    expect(await page.getByRole('region', { name: 'Design basis' }).getByLabel('γG').isDisabled()).toBe(true);
    await page.getByText('Only the fire engineer may change the design basis.').waitFor();
    await leave(page);
  });

  it('the specifier changes members, protection and takeoff, and neither period nor temperature', async () => {
    const page = await people.person('Specifier');
    expect(await pagesOf(page)).toEqual(allPages);
    await openMember(page, 'L1-SB03');
    expect(await buttons(page)).not.toContain('Critical temperature');
    await page.getByRole('button', { name: 'Change member' }).click();
    await page.getByRole('dialog').getByLabel('Note').fill('Seen on site (invented)');
    await page.getByRole('dialog').getByRole('button', { name: 'Save' }).click();
    await page.getByRole('dialog').waitFor({ state: 'hidden' });
    await page.getByText('Seen on site (invented)').first().waitFor();
    await goTo(page, 'Zones');
    const offered = await buttons(page);
    expect(offered).toContain('Protection of zone Z06');
    expect(offered.filter((name) => name.startsWith('Edit zone'))).toEqual([]);
    await goTo(page, 'Quantities');
    await page.getByRole('table').first().waitFor();
    await leave(page);
  });

  it('the second specifier reads what the first did, and verifies what was issued', async () => {
    const page = await people.person('Specifier, checks');
    await goTo(page, 'Schedule');
    await page.getByRole('link', { name: 'P01', exact: true }).click();
    await page.getByRole('button', { name: 'Verify' }).click();
    await page.getByText('The frozen schedule and the PDF both match their digests.').waitFor();
    // inside the page, which its policy allows for this address alone
    await page.getByRole('button', { name: 'Show it here' }).click();
    const pdf = await page.request.get((await page.locator('iframe').getAttribute('src')) ?? '');
    expect(pdf.headers()['content-type']).toBe('application/pdf');
    expect(pdf.headers()['content-security-policy']).toContain("frame-ancestors 'self'");
    expect((await page.request.get('/')).headers()['content-security-policy']).toContain("frame-ancestors 'none'");
    await leave(page);
  });

  it.each([['Contractor'], ['Inspector'], ['Reader']])('the %s reads what is issued, and nothing else', async (role) => {
    const page = await people.person(role);
    expect(await pagesOf(page)).toEqual(issuedPages);
    await page.getByRole('region', { name: 'Elevation' }).waitFor();
    await goTo(page, 'Site');
    await heading(page).filter({ hasText: /P0\d/ }).waitFor();
    // the inspector holds work against the schedule: what to buy is not theirs
    expect(await page.getByRole('table', { name: 'To buy for the whole job' }).count()).toBe(role === 'Inspector' ? 0 : 1);
    expect(await page.getByRole('columnheader', { name: 'EUR' }).count()).toBe(0);
    await goTo(page, 'Schedule');
    expect(await buttons(page)).toEqual([]);
    await page.getByRole('link', { name: 'P01', exact: true }).click();
    await settled(page);
    const [download] = await Promise.all([page.waitForEvent('download'), page.getByRole('link', { name: 'Download', exact: true }).click()]);
    expect(download.suggestedFilename()).toMatch(/P01\.pdf$/);
    const project = projectOf(page);
    for (const name of ['zones', 'members', 'members/import', 'products', 'quantities']) {
      await page.goto(`${project}/${name}`);
      await page.getByText('Not yours to see').waitFor();
      if (name !== 'members/import') expect(await answer(page, `/${name}`)).toBe(403);
    }
    await page.goto(`${project}/team`);
    await settled(page);
    expect(await buttons(page)).toEqual([]);
    expect(await page.getByRole('region', { name: 'Design basis' }).count()).toBe(0);
    await leave(page);
  });

  it('the administrator keeps accounts and products, and opens no project', async () => {
    const specifier = await people.person('Specifier');
    const project = projectOf(specifier);
    const page = await people.visitor();
    await signIn(page, account('Administrator'));
    expect(await pagesOf(page)).toEqual(['Projects', 'Product library', 'Accounts']);
    await heading(page).filter({ hasText: 'You are on no project yet' }).waitFor();
    await page.goto(project);
    await heading(page).waitFor();
    expect(await page.getByText('Marrow Gate').count()).toBe(0);
    expect((await page.request.get(`/api${project}`)).status()).toBe(404);
    await page.goto('/accounts');
    await page.getByText(account('Contractor').email).waitFor();
    await page.goto('/products');
    await page.getByRole('button', { name: 'Add a product' }).waitFor();
    // the description of the API is shown whole: what the policy refused of it would be a fault
    await page.goto('/api/docs');
    await page.locator('.swagger-ui .info').waitFor();
    await page.goto('/projects');
    // and whoever is no administrator finds both closed
    await specifier.goto('/accounts');
    await heading(specifier).filter({ hasText: 'Accounts are the administrator' }).waitFor();
    expect((await specifier.request.get('/api/users')).status()).toBe(403);
    await specifier.goto('/products');
    await settled(specifier);
    expect(await buttons(specifier)).not.toContain('Add a product');
    await leave(page);
  });
});

describe('a role taken away while its holder is signed in', () => {
  it('is gone from their open page, and from what they send', async () => {
    const fireEngineer = await people.person('Fire engineer');
    const reader = await people.person('Reader');
    const project = projectOf(reader);
    await goTo(reader, 'Site');
    await goTo(fireEngineer, 'Team and basis');
    const { name, email } = account('Reader');
    await fireEngineer.getByRole('button', { name: `Roles of ${name}` }).click();
    await fireEngineer.getByRole('dialog').getByRole('button', { name: 'Remove' }).click();
    await fireEngineer.getByRole('button', { name: 'Remove' }).last().click();
    await fireEngineer.getByRole('dialog').waitFor({ state: 'hidden' });
    // without a reload: the page that was open says so by itself
    await reader.getByRole('heading', { level: 1, name: /project/i }).waitFor();
    expect(await reader.getByText('Marrow Gate').count()).toBe(0);
    expect((await reader.request.get(`/api${project}/site`)).status()).toBe(404);
    await fireEngineer.getByRole('button', { name: 'Add a person' }).click();
    await fireEngineer.getByRole('dialog').getByLabel('E-mail').fill(email);
    await fireEngineer.getByRole('dialog').getByLabel(/^Reader/).check();
    await fireEngineer.getByRole('dialog').getByRole('button', { name: 'Add to the team' }).click();
    await fireEngineer.getByRole('region', { name: 'People' }).getByText(name).waitFor();
    await reader.goto(`${project}/site`);
    await heading(reader).filter({ hasText: /P0\d/ }).waitFor();
  });
});
