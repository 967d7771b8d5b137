import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { People, account, faults, goTo } from './support/browser.js';

let people: People;
beforeAll(async () => { people = await People.start(); });
afterAll(async () => {
  await people.stop();
  expect(faults).toEqual([]);
});

const place = (page: Page) => page.getByRole('textbox', { name: 'Place' });
const particulars = (page: Page) => page.locator('form').filter({ has: place(page) });
const save = (page: Page) => particulars(page).getByRole('button', { name: 'Save' }).click();
const saved = (page: Page) => particulars(page).getByText('Saved values.').waitFor();
async function atWork(): Promise<Page> {
  const page = await people.person('Fire engineer');
  await goTo(page, 'Team and basis');
  await place(page).waitFor();
  return page;
}

describe('nothing typed is lost', () => {
  it('two people on one form compare field by field, and either version can be kept', async () => {
    const [first, second] = [await atWork(), await atWork()];
    for (const choice of ['Yours', account('Fire engineer').name] as const) {
      await place(second).fill(`Second, ${choice}`);
      await place(first).fill(`First, ${choice}`);
      await save(first);
      await saved(first);
      await save(second);
      await second.getByRole('heading', { name: /somebody else saved this/ }).waitFor();
      // both changed it: nothing is saved before it is chosen
      await second.getByRole('button', { name: 'Save this' }).click();
      await second.getByText('One field is still to be chosen.').waitFor();
      await second.getByRole('radio', { name: new RegExp(`^Place: ${choice}`) }).check();
      await second.getByRole('button', { name: 'Save this' }).click();
      await saved(second);
      expect(await place(second).inputValue()).toBe(choice === 'Yours' ? `Second, ${choice}` : `First, ${choice}`);
      await first.reload();
      await place(first).waitFor();
    }
    await first.context().close();
    await second.context().close();
  });

  it('a session that ends while somebody types is signed into over the page, which stays', async () => {
    const page = await atWork();
    await place(page).fill('Typed before the session ended');
    await page.context().clearCookies();
    await save(page);
    const dialog = page.getByRole('dialog');
    await dialog.getByLabel('Password').fill(account('Fire engineer').password);
    await dialog.getByRole('button', { name: 'Sign in' }).click();
    await dialog.waitFor({ state: 'hidden' });
    expect(await place(page).inputValue()).toBe('Typed before the session ended');
    await save(page);
    await saved(page);
    await page.context().close();
  });

  it('a save that the server does not hear keeps the form, and goes through later', async () => {
    const page = await atWork();
    await place(page).fill('Typed while the server was gone');
    // the connection is cut for this one request; the server itself goes on
    await page.route('**/api/projects/*', (route) => (route.request().method() === 'PATCH' ? route.abort() : route.continue()));
    await save(page);
    await page.getByText(/cannot be reached/).waitFor();
    expect(await place(page).inputValue()).toBe('Typed while the server was gone');
    await page.unroute('**/api/projects/*');
    await page.getByRole('button', { name: 'Save again' }).click();
    await saved(page);
    await page.context().close();
  });

  it('a save whose answer is lost counts as saved when it is sent again', async () => {
    const page = await atWork();
    await place(page).fill('Saved without an answer');
    await page.route('**/api/projects/*', async (route) => {
      if (route.request().method() !== 'PATCH') return route.continue();
      await route.fetch();
      return route.abort();
    });
    await save(page);
    await page.getByText(/cannot be reached/).waitFor();
    await page.unroute('**/api/projects/*');
    await page.getByRole('button', { name: 'Save again' }).click();
    await saved(page);
    expect(await page.getByRole('heading', { name: /somebody else/ }).count()).toBe(0);
    await page.context().close();
  });

  it('a reload brings the draft back, and signing out asks before it is taken away', async () => {
    const page = await atWork();
    await place(page).fill('Typed and not saved');
    await page.waitForFunction(() => Object.keys(localStorage).some((key) => key.startsWith('mantlet.draft.')));
    page.on('dialog', (dialog) => { void dialog.accept(); });
    await page.reload();
    await page.getByText(/^You left changes here/).waitFor();
    await page.getByRole('button', { name: 'Put them back' }).click();
    expect(await place(page).inputValue()).toBe('Typed and not saved');
    await particulars(page).getByRole('button', { name: 'Undo my changes' }).click();
    expect(await place(page).inputValue()).not.toBe('Typed and not saved');
    await place(page).fill('Typed and not saved');
    await page.locator('.mt-strip-who').click();
    await page.getByText('Sign out', { exact: true }).click();
    await page.getByText('Sign out without saving?').last().waitFor();
    await page.getByRole('button', { name: 'Stay here' }).click();
    expect(await place(page).inputValue()).toBe('Typed and not saved');
    await page.locator('.mt-strip-who').click();
    await page.getByText('Sign out', { exact: true }).click();
    await page.getByRole('button', { name: 'Sign out and discard' }).click();
    await page.getByRole('button', { name: 'Sign in' }).waitFor();
    expect(await page.evaluate(() => Object.keys(localStorage).filter((key) => key.startsWith('mantlet.draft.')))).toEqual([]);
    await page.context().close();
  });
});
