import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { People, account, faults, heading, settled } from './support/browser.js';
import { tabTo } from './support/keyboard.js';

let people: People;
let page: Page;
beforeAll(async () => {
  people = await People.start();
  page = await people.visitor();
});
afterAll(async () => {
  await people.stop();
  expect(faults).toEqual([]);
});

const pageLink = (name: string) => page.getByRole('navigation', { name: 'Pages' }).getByRole('link', { name: new RegExp(`^${name}`) });
async function goTo(name: string): Promise<void> {
  // the list of pages stands before the page: from its heading it is reached backwards
  await tabTo(page, pageLink(name), { back: true });
  await page.keyboard.press('Enter');
  await pageLink(name).and(page.locator('[aria-current=page]')).waitFor();
  await settled(page);
}

/** Nothing here moves or presses a pointer. */
describe('the main job with the keyboard alone', () => {
  it('signing in', async () => {
    await page.goto('/');
    await tabTo(page, page.getByLabel('E-mail'));
    await page.keyboard.type(account('Structural engineer').email);
    await tabTo(page, page.getByLabel('Password', { exact: true }));
    await page.keyboard.type(account('Structural engineer').password);
    await page.keyboard.press('Enter');
    await page.getByRole('link', { name: 'Mantlet, all projects' }).waitFor();
    await settled(page);
  });

  it('from the building to a zone of it', async () => {
    await tabTo(page, page.getByRole('main').getByRole('link', { name: /Marrow Gate Civic Library/ }).first());
    await page.keyboard.press('Enter');
    // the drawing is one stop of the Tab key; arrows go from zone to zone as they stand
    const drawing = page.getByRole('region', { name: 'Elevation' }).locator('svg');
    await tabTo(page, drawing.locator('a[tabindex="0"]'));
    const focused = () => page.evaluate(() => document.activeElement?.getAttribute('aria-label') ?? '');
    for (const key of ['ArrowDown', 'ArrowUp']) {
      for (let steps = 0; steps < 8 && !/level L2/.test(await focused()); steps += 1) await page.keyboard.press(key);
    }
    for (const key of ['ArrowLeft', 'ArrowRight']) {
      for (let steps = 0; steps < 4 && !/^Zone Z07/.test(await focused()); steps += 1) await page.keyboard.press(key);
    }
    expect(await focused()).toMatch(/^Zone Z07 .*level L2: R \d+/);
    await page.keyboard.press('Enter');
    await page.getByRole('heading', { level: 1 }).waitFor();
    await page.waitForURL(/zones/);
    await settled(page);
  });

  it('skips the list of pages', async () => {
    // as it is loaded anew, without a zone that the page goes to by itself
    await page.goto(new URL(page.url()).pathname);
    await settled(page);
    await page.keyboard.press('Tab');
    expect(await page.evaluate(() => document.activeElement?.textContent)).toBe('Skip to the page');
    await page.keyboard.press('Enter');
    expect(await page.evaluate(() => document.activeElement?.id)).toBe('main');
  });

  it('to a member, found in the list', async () => {
    await goTo('Members');
    await tabTo(page, page.getByLabel('Search'));
    await page.keyboard.type('L2-SB01');
    await expect.poll(() => page.getByRole('grid').getAttribute('aria-rowcount')).toBe('2');
    await tabTo(page, page.getByRole('row', { name: /L2-SB01/ }));
    await page.keyboard.press('Enter');
    await page.getByRole('link', { name: 'All members' }).waitFor();
    await settled(page);
    // whoever listens hears the answer at once
    await expect.poll(() => page.evaluate(() => document.activeElement?.tagName)).toBe('H1');
  });

  it('whose critical temperature is declared, and the answer follows', async () => {
    await tabTo(page, page.getByRole('button', { name: 'Critical temperature' }));
    await page.keyboard.press('Enter');
    const drawer = page.getByRole('dialog');
    const way = drawer.getByRole('combobox', { name: 'How it comes about' });
    // the form begins in its first field
    await expect.poll(() => way.evaluate((field) => field === document.activeElement)).toBe(true);
    await page.keyboard.press('Enter');
    const choice = page.locator('.ant-select-dropdown:visible');
    for (let steps = 0; steps < 8 && !(await choice.locator('.ant-select-item-option-active').filter({ hasText: 'Declared' }).isVisible()); steps += 1) await page.keyboard.press('ArrowDown');
    await page.keyboard.press('Enter');
    await tabTo(page, drawer.getByLabel('Critical temperature'));
    await page.keyboard.press('Control+A');
    await page.keyboard.type('541');
    await tabTo(page, drawer.getByLabel('Reference'));
    await page.keyboard.press('Control+A');
    await page.keyboard.type('Calculation by hand, sheet 7 (invented)');
    await tabTo(page, drawer.getByRole('button', { name: 'Save' }));
    await page.keyboard.press('Enter');
    await drawer.waitFor({ state: 'hidden' });
    await page.getByText(/541\s°C/).first().waitFor();
    // the focus is back on what opened the form
    await expect.poll(() => page.getByRole('button', { name: 'Critical temperature' }).evaluate((button) => button === document.activeElement)).toBe(true);
  });

  it('to an issued revision, and out again', async () => {
    await goTo('Schedule');
    await tabTo(page, page.getByRole('link', { name: 'P01', exact: true }));
    await page.keyboard.press('Enter');
    await heading(page).filter({ hasText: 'P01' }).waitFor();
    await settled(page);
    await tabTo(page, page.getByRole('button', { name: 'Verify' }));
    await page.keyboard.press('Enter');
    await page.getByText('The frozen schedule and the PDF both match their digests.').waitFor();
    await tabTo(page, page.locator('.mt-strip-who'), { back: true });
    await page.keyboard.press('Enter');
    await page.getByRole('menuitem', { name: 'Sign out' }).waitFor();
    for (let steps = 0; steps < 12 && (await page.evaluate(() => document.activeElement?.textContent)) !== 'Sign out'; steps += 1) await page.keyboard.press('ArrowDown');
    await page.keyboard.press('Enter');
    await page.getByRole('button', { name: 'Sign in' }).waitFor();
  });
});
