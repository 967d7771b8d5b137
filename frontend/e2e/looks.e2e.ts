import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { violations } from './support/axe.js';
import { People, account, choose, faults, goTo, openMember, settled, signIn } from './support/browser.js';
import { misfits } from './support/fit.js';

let people: People;
beforeAll(async () => { people = await People.start(); });
afterAll(async () => {
  await people.stop();
  expect(faults).toEqual([]);
});

const wide = { width: 1440, height: 920 };
/** 1440 px at 200 %, and the 320 px that WCAG 1.4.10 asks for (1280 px at 400 %) */
const narrow = [{ width: 720, height: 460 }, { width: 320, height: 600 }];

async function onGround(page: Page, ground: 'light' | 'dark'): Promise<void> {
  await page.emulateMedia({ colorScheme: ground });
  await page.locator(`html[data-ground=${ground}]`).waitFor();
}

/** What is wrong with the page as it stands, on both grounds and at every width. */
async function look(page: Page): Promise<Record<string, string[]>> {
  const found: Record<string, string[]> = {};
  const keep = (where: string, what: string[]) => { if (what.length) found[where] = what; };
  await page.evaluate(() => document.fonts.ready.then(() => undefined));
  keep('light', await violations(page));
  await onGround(page, 'dark');
  keep('dark', await violations(page));
  await onGround(page, 'light');
  for (const size of narrow) {
    await page.setViewportSize(size);
    // drawings and folded tables take a frame or two to follow
    await expect.poll(() => misfits(page), { timeout: 3000 }).toEqual([]).catch(() => undefined);
    keep(`${size.width} px`, await misfits(page));
  }
  await page.setViewportSize(wide);
  return found;
}

interface View { name: string; open: (page: Page) => Promise<unknown> }
const press = (name: string | RegExp) => async (page: Page): Promise<void> => { await page.getByRole('button', { name }).first().click(); };
const drawer = (page: Page) => page.getByRole('dialog').last().waitFor();
/** A page of the project by its address, then what is opened on it. */
const on = (at: string, ...steps: ((page: Page) => Promise<unknown>)[]) => async (page: Page): Promise<void> => {
  const project = /\/projects\/[0-9a-f-]+/.exec(page.url())?.[0] ?? '';
  await page.goto(at.startsWith('/') ? at : `${project}/${at}`);
  await settled(page);
  for (const step of steps) await step(page);
};
const sheetOf = (mark: string) => (page: Page) => openMember(page, mark);
const file = 'Mark;What it is made of\nL3-PB04;UB 457x191x74\nL9-NO01;nothing known\n';

const specifier: View[] = [
  { name: 'Building', open: on('') },
  { name: 'Zones', open: on('zones') },
  { name: 'a zone’s target', open: on('zones', press('Target of Z07'), (page) => page.getByRole('cell', { name: /needs/ }).first().waitFor()) },
  { name: 'protection of a zone', open: on('zones', press('Protection of zone Z12'), drawer) },
  { name: 'Members', open: on('members') },
  { name: 'a filter being set', open: on('members?sectionFactorAbove=200', (page) => page.getByRole('button', { name: /^A\/V above 200/ }).click(), (page) => page.getByRole('group', { name: 'Filter by A/V' }).waitFor()) },
  { name: 'nothing that fits', open: on('members?search=nobody', (page) => page.getByText('No member fits all of these').waitFor()) },
  { name: 'the columns of the list', open: on('members', press('Columns'), drawer) },
  { name: 'values for many', open: on('members?sectionFactorAbove=150', (page) => page.getByLabel('Choose all that are found').check(), press('Set values'), drawer) },
  { name: 'a new member', open: on('members', press('Add a member'), drawer) },
  { name: 'a member’s sheet', open: on('', sheetOf('L0-TB01')) },
  { name: 'a member to change', open: on('', sheetOf('L0-TB01'), press('Change member'), drawer) },
  { name: 'a question before deleting', open: on('', sheetOf('L0-TB01'), press('Delete'), drawer) },
  { name: 'an import', open: on('members/import') },
  {
    name: 'the columns of an import',
    open: on('members/import', (page) => page.locator('input[type=file]').setInputFiles({ name: 'steel.csv', mimeType: 'text/csv', buffer: Buffer.from(file) }), (page) => page.getByRole('button', { name: 'Check the rows' }).waitFor()),
  },
  { name: 'Products', open: on('products') },
  { name: 'a product', open: on('products', (page) => page.getByRole('link', { name: 'Demo Coat W' }).click(), (page) => page.getByRole('link', { name: 'All products' }).waitFor(), settled) },
  { name: 'a new product', open: on('products', press('Add a product'), drawer) },
  { name: 'Quantities', open: on('quantities') },
  { name: 'Schedule', open: on('schedule') },
  { name: 'a revision', open: on('schedule', (page) => page.getByRole('link', { name: 'P01', exact: true }).click(), press('Show it here'), (page) => page.locator('iframe').waitFor()) },
  { name: 'Site, a floor of it', open: on('site', (page) => choose(page, page, 'Floor', /^L3 Third floor/)) },
  { name: 'Team and basis', open: on('team') },
  { name: 'somebody for the team', open: on('team', press('Add a person'), drawer) },
  { name: 'somebody’s roles', open: on('team', press(/^Roles of/), drawer) },
  { name: 'a page that is not there', open: on('nowhere') },
  { name: 'Projects', open: on('/projects', (page) => page.locator('.mt-project svg.mt-drawing').waitFor()) },
  { name: 'a new project', open: on('/projects', press('Start a project'), drawer) },
  { name: 'Help', open: on('/help') },
  { name: 'one’s account', open: on('/account') },
  { name: 'the menu of the account', open: on('/help', async (page) => { await page.locator('.mt-strip-who').click(); await page.getByRole('menuitem', { name: 'Sign out' }).waitFor(); }) },
  { name: 'the library of products', open: on('/products') },
];
const fireEngineer: View[] = [
  { name: 'a zone to change', open: on('zones', press('Edit zone Z07'), drawer) },
  { name: 'a level to change', open: on('zones', press('Edit level L2'), drawer) },
  { name: 'an acceptance', open: on('', sheetOf('L5-C08'), press('Accept'), drawer) },
];
const structuralEngineer: View[] = [
  { name: 'a critical temperature', open: on('', sheetOf('L4-PB14'), press('Critical temperature'), drawer, (page) => choose(page, page.getByRole('dialog'), 'How it comes about', 'Calculated from actions')) },
];
const contractor: View[] = [
  { name: 'Building as issued', open: on('', (page) => page.getByRole('region', { name: 'Elevation' }).waitFor()) },
  { name: 'Site for those who read it', open: on('site', (page) => choose(page, page, 'Floor', /^B1 Basement/)) },
  { name: 'a page that is not theirs', open: on('zones', (page) => page.getByText('Not yours to see').waitFor()) },
];
const administrator: View[] = [
  { name: 'Projects without any', open: on('/projects') },
  { name: 'Accounts', open: on('/accounts') },
  { name: 'an invitation', open: on('/accounts', press('Invite somebody'), drawer) },
  { name: 'an account to change', open: on('/accounts', press('Edit Petra Hollowell'), drawer) },
];
const heading1 = (page: Page) => page.getByRole('heading', { level: 1 }).waitFor();
const nobody: View[] = [
  { name: 'signing in', open: on('/sign-in', heading1) },
  { name: 'a forgotten password', open: on('/forgotten-password', heading1) },
  { name: 'an invitation that is over', open: on('/accept-invitation#gone', heading1) },
  { name: 'a reset that is over', open: on('/reset-password', heading1) },
  {
    name: 'caught mail',
    open: async (page) => {
      await page.request.post('/api/password-resets', { data: { email: account('Reader').email } });
      await page.goto('/caught-mail');
      await page.getByRole('row').filter({ hasText: account('Reader').email }).first().getByRole('link').click();
      await page.getByRole('region', { name: 'Choose another password for Mantlet' }).waitFor();
    },
  },
  { name: 'another password', open: async (page) => { await page.getByRole('region', { name: 'Choose another password for Mantlet' }).getByRole('link').click(); await page.getByLabel('Password').waitFor(); } },
];

describe.each([
  ['Specifier', specifier], ['Fire engineer', fireEngineer], ['Structural engineer', structuralEngineer], ['Contractor', contractor], ['Administrator', administrator], ['nobody', nobody],
] as const)('what the %s sees fits and is accessible, light and dark', (role, views) => {
  let page: Page;
  beforeAll(async () => {
    page = role === 'nobody' || role === 'Administrator' ? await people.visitor() : await people.person(role);
    if (role === 'Administrator') await signIn(page, account(role));
  });

  it.each(views)('$name', async ({ open }) => {
    await open(page);
    expect(await look(page)).toEqual({});
  });
});

it('the ground is as the system asks', async () => {
  const page = await people.visitor({ dark: true });
  await page.goto('/');
  await page.getByRole('button', { name: 'Sign in' }).waitFor();
  expect(await page.evaluate(() => getComputedStyle(document.documentElement).getPropertyValue('--paper').trim().toUpperCase())).toBe('#121718');
  await onGround(page, 'light');
  expect(await page.evaluate(() => getComputedStyle(document.documentElement).getPropertyValue('--paper').trim().toUpperCase())).toBe('#F5F1E6');
});

it('the list of pages fits a phone as well, where it is a drawer', async () => {
  const page = await people.person('Specifier');
  await goTo(page, 'Members');
  await page.setViewportSize({ width: 320, height: 600 });
  expect(await violations(page)).toEqual([]);
  await page.getByRole('button', { name: 'Menu' }).click();
  await page.getByRole('dialog').getByRole('link', { name: 'Zones' }).waitFor();
  expect(await violations(page)).toEqual([]);
  expect(await misfits(page)).toEqual([]);
  await page.getByRole('dialog').getByRole('link', { name: 'Zones' }).click();
  await settled(page);
  expect(await violations(page)).toEqual([]);
});
