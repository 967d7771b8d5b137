import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { People, faults, goTo, settled } from './support/browser.js';

let people: People;
let page: Page;
beforeAll(async () => {
  people = await People.start();
  page = await people.person('Specifier');
  await goTo(page, 'Members');
  await page.getByRole('grid').waitFor();
});
afterAll(async () => {
  await people.stop();
  expect(faults).toEqual([]);
});

const found = (): Promise<number> => page.getByRole('grid').getAttribute('aria-rowcount').then((rows) => Number(rows) - 1);
const focused = (): Promise<{ row: string | null; text: string }> =>
  page.evaluate(() => ({ row: document.activeElement?.getAttribute('aria-rowindex') ?? null, text: document.activeElement?.textContent ?? '' }));

describe('four hundred members', () => {
  it('are walked by keyboard, chosen row by row, and a sheet opened among them leads back to its row', async () => {
    const all = await found();
    expect(all).toBeGreaterThanOrEqual(400);
    await page.getByRole('row').nth(1).focus();
    await page.keyboard.press('End');
    await expect.poll(focused).toMatchObject({ row: String(all + 1) });
    // its rows are fetched as they come into sight
    await page.getByText('is being fetched').first().waitFor({ state: 'detached' });
    await page.keyboard.press(' ');
    await page.keyboard.press('Shift+ArrowUp');
    await page.keyboard.press('Shift+ArrowUp');
    await page.getByText('3 members chosen').waitFor();
    const before = await focused();
    expect(before.row).toBe(String(all - 1));
    await page.keyboard.press('Enter');
    await page.getByRole('link', { name: 'All members' }).waitFor();
    await page.goBack();
    await page.getByRole('grid').waitFor();
    // the same row has the focus again, in sight
    await expect.poll(focused).toEqual(before);
    expect(await page.evaluate(() => document.activeElement?.getBoundingClientRect().top ?? -1)).toBeGreaterThan(0);
  });

  it('are narrowed by keyboard, in words and in the address', async () => {
    await page.goto(new URL(page.url()).pathname);
    await settled(page);
    const all = await found();
    await page.getByRole('combobox', { name: 'Add a filter' }).focus();
    await page.keyboard.type('A/V');
    await page.keyboard.press('Enter');
    await page.getByRole('group', { name: 'Filter by A/V' }).waitFor();
    await expect.poll(() => page.evaluate(() => document.activeElement?.getAttribute('role'))).toBe('spinbutton');
    await page.keyboard.type('200');
    await page.keyboard.press('Tab');
    await page.getByRole('list', { name: 'Filters' }).getByText('A/V above 200').waitFor();
    await expect.poll(found).toBeLessThan(all);
    expect(await found()).toBeGreaterThan(0);
    expect(new URL(page.url()).searchParams.get('sectionFactorAbove')).toBe('200');
    await page.keyboard.press('Escape');
    await expect.poll(() => page.evaluate(() => document.activeElement?.getAttribute('role'))).toBe('combobox');
    await page.getByRole('columnheader', { name: 'A/V' }).getByRole('button').click();
    await page.locator('[role=columnheader][aria-sort=ascending]').filter({ hasText: 'A/V' }).waitFor();
  });

  it('are kept as a list under a name, which is there again after a reload', async () => {
    const narrowed = await found();
    await page.getByRole('button', { name: 'Keep this list' }).click();
    await page.getByRole('dialog').getByLabel('Name').fill('Slender ones');
    await page.getByRole('dialog').getByRole('button', { name: 'Keep', exact: true }).click();
    const own = page.getByRole('navigation', { name: 'Lists' }).getByRole('link', { name: 'Slender ones' });
    await own.waitFor();
    await page.getByRole('navigation', { name: 'Lists' }).getByRole('link', { name: 'All', exact: true }).click();
    await expect.poll(found).toBeGreaterThan(narrowed);
    await page.reload();
    await own.click();
    await expect.poll(found).toBe(narrowed);
    expect(await own.getAttribute('aria-current')).toBe('true');
  });

  it('are changed all that are found at once, with a word beforehand about how many', async () => {
    const narrowed = await found();
    await page.getByLabel('Choose all that are found').check();
    await page.getByText(`${narrowed} members chosen`).waitFor();
    await page.getByRole('button', { name: 'Set values' }).click();
    const drawer = page.getByRole('dialog');
    // whichever grade they do not all have already
    for (const grade of ['S460', 'S420']) {
      await drawer.getByRole('combobox', { name: 'Steel grade' }).click();
      await page.locator('.ant-select-dropdown:visible').getByTitle(grade, { exact: true }).click();
      await drawer.getByText(/\d+ of \d+ would change/).waitFor();
      if (!(await drawer.getByText(`0 of ${narrowed} would change`).isVisible())) break;
    }
    const would = Number(/^(\d+) of/.exec((await drawer.getByText(/would change/).textContent()) ?? '')?.[1]);
    expect(would).toBeGreaterThan(0);
    await drawer.getByRole('button', { name: `Set on ${narrowed} members` }).click();
    await page.getByText(new RegExp(`^${would} members? changed`)).waitFor();
    await drawer.waitFor({ state: 'hidden' });
    await page.getByText(/members chosen/).waitFor({ state: 'hidden' });
  });

  it('show the columns that one wants, and say when nothing fits', async () => {
    await page.getByRole('button', { name: 'Columns' }).click();
    await page.getByRole('dialog').getByRole('checkbox', { name: 'Product' }).check();
    await page.getByRole('dialog').getByRole('button', { name: 'Done' }).click();
    await page.getByRole('columnheader', { name: 'Product' }).waitFor();
    await page.getByLabel('Search').fill('nobody %_');
    await page.getByText('No member fits all of these').waitFor();
    await page.getByRole('button', { name: /^Without the search/ }).click();
    await page.getByRole('grid').waitFor();
    await page.getByRole('link', { name: 'Slender ones' }).click();
    await page.getByRole('button', { name: 'Forget Slender ones' }).click();
    await page.getByRole('button', { name: 'Forget it' }).click();
    await page.getByRole('link', { name: 'Slender ones' }).waitFor({ state: 'detached' });
  });
});
