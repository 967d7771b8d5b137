import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { violations } from './support/axe.js';
import { People, account, faults, heading, settled, signOut } from './support/browser.js';

let people: People;
beforeAll(async () => { people = await People.start(); });
afterAll(async () => {
  await people.stop();
  expect(faults).toEqual([]);
});

describe('who comes in, and what they find', () => {
  it('a wrong password is refused in words, and the e-mail stays', async () => {
    const page = await people.visitor();
    await page.goto('/');
    await page.getByLabel('E-mail').fill(account('Specifier').email);
    await page.getByLabel('Password', { exact: true }).fill('not the password');
    await page.getByRole('button', { name: 'Sign in' }).click();
    await page.getByRole('alert').waitFor();
    expect(await page.getByLabel('E-mail').inputValue()).toBe(account('Specifier').email);
  });

  it('the first visitor of an empty installation makes the administrator’s account', async () => {
    const page = await people.visitor({ empty: true });
    await page.goto('/');
    await heading(page).filter({ hasText: 'Make the first account' }).waitFor();
    await page.getByLabel('Name').fill('Somebody First');
    await page.getByLabel('E-mail').fill('first@office.example.test');
    await page.getByLabel('Password', { exact: true }).fill('too short');
    await page.getByRole('button', { name: 'Make the account' }).click();
    await page.getByText('Password needs at least 12 characters.').waitFor();
    await page.getByLabel('Password', { exact: true }).fill('four unrelated words here');
    await page.getByRole('button', { name: 'Make the account' }).click();
    await page.getByRole('link', { name: 'Accounts', exact: true }).waitFor();
    // an empty project leads on, step by step
    await page.getByRole('link', { name: 'Mantlet, all projects' }).click();
    await page.getByRole('button', { name: 'Start a project' }).first().click();
    const drawer = page.getByRole('dialog');
    await drawer.getByLabel('Number').fill('00-001');
    await drawer.getByLabel('Name').fill('First shed (invented)');
    await drawer.getByLabel(/^Fire engineer/).check();
    await drawer.getByRole('button', { name: 'Start the project' }).click();
    await drawer.waitFor({ state: 'hidden' });
    await settled(page);
    await page.locator('.mt-first').getByRole('link').first().waitFor();
    expect(await violations(page)).toEqual([]);
    await signOut(page);
    const second = await people.visitor({ empty: true });
    await second.goto('/set-up');
    await second.getByRole('button', { name: 'Sign in' }).waitFor();
  });
});
