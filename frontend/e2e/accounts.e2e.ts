import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { People, account, faults, goTo, heading, signIn } from './support/browser.js';

let people: People;

beforeAll(async () => { people = await People.start(); });
afterAll(async () => {
  await people.stop();
  expect(faults).toEqual([]);
});

/** Opens the newest mail to the address on the page of caught mail, and follows its link. */
async function followMail(page: Page, address: string, subject: string): Promise<void> {
  await page.goto('/caught-mail');
  await page.getByRole('row').filter({ hasText: address }).filter({ hasText: subject }).first().getByRole('link').click();
  await page.getByRole('region', { name: subject }).getByRole('link').click();
}

describe('a stranger finds their way in', () => {
  const email = 'ines@newcomers.example.test';
  const password = 'four unrelated words here';
  let stranger: Page;
  let phone: Page;

  it('by an invitation that the administrator sends', async () => {
    const administrator = await people.visitor();
    await signIn(administrator, account('Administrator'));
    await administrator.getByRole('link', { name: 'Accounts', exact: true }).click();
    await administrator.getByRole('button', { name: 'Invite somebody' }).click();
    await administrator.getByLabel('Name').fill('Ines Newcomer');
    await administrator.getByLabel('E-mail').fill(email);
    await administrator.getByRole('button', { name: 'Send the invitation' }).click();
    await administrator.getByRole('row', { name: /Ines Newcomer/ }).getByText(/^Invited, until/).waitFor();
    stranger = await people.visitor();
    await followMail(stranger, email, 'Your account on Mantlet');
    await heading(stranger).filter({ hasText: 'Welcome, Ines Newcomer' }).waitFor();
    await stranger.getByLabel('Password').fill('too short');
    await stranger.getByRole('button', { name: 'Begin' }).click();
    await stranger.getByText('Password needs at least 12 characters.').waitFor();
    await stranger.getByLabel('Password').fill(password);
    await stranger.getByRole('button', { name: 'Begin' }).click();
    await stranger.getByRole('link', { name: 'Mantlet, all projects' }).waitFor();
    await administrator.reload();
    await administrator.getByRole('row', { name: /Ines Newcomer/ }).getByText('In use').waitFor();
    // whoever follows it again, signed in as somebody else, finds it over
    await followMail(administrator, email, 'Your account on Mantlet');
    await heading(administrator).filter({ hasText: 'This invitation is over' }).waitFor();
  });

  it('onto the team of a project, which they are told of', async () => {
    const specifier = await people.person('Specifier');
    await goTo(specifier, 'Team and basis');
    await specifier.getByRole('button', { name: 'Add a person' }).click();
    await specifier.getByLabel('E-mail').fill(email);
    await specifier.getByLabel(/^Reader/).check();
    await specifier.getByRole('button', { name: 'Add to the team' }).click();
    await specifier.getByRole('region', { name: 'People' }).getByText('Ines Newcomer').waitFor();
    await followMail(stranger, email, 'You are on the team of');
    await stranger.getByRole('navigation', { name: 'Pages' }).getByRole('link', { name: /^Schedule/ }).waitFor();
  });

  it('again when the password is forgotten, which ends the sessions elsewhere', async () => {
    phone = await people.visitor();
    await phone.goto('/');
    await phone.getByRole('link', { name: 'Forgotten password?' }).click();
    // the sign-in page has such a field too, and stays until the next one is there
    await heading(phone).filter({ hasText: 'Choose another password by e-mail' }).waitFor();
    await phone.getByLabel('E-mail').fill(email);
    await phone.getByRole('button', { name: 'Send the link' }).click();
    await heading(phone).filter({ hasText: 'Look into your mailbox' }).waitFor();
    await followMail(phone, email, 'Choose another password for Mantlet');
    await phone.getByLabel('Password').fill('five other unrelated words');
    await phone.getByRole('button', { name: 'Save and sign in' }).click();
    await phone.getByRole('link', { name: 'Mantlet, all projects' }).waitFor();
    await stranger.goto('/account');
    await stranger.getByRole('button', { name: 'Sign in' }).waitFor();
  });

  it('and ends a session that was left open somewhere', async () => {
    await signIn(stranger, { email, password: 'five other unrelated words' });
    await phone.goto('/account');
    await heading(phone).filter({ hasText: 'You are signed in with 2 browsers' }).waitFor();
    await phone.getByRole('button', { name: /^End the session with/ }).click();
    await heading(phone).filter({ hasText: 'You are signed in here only' }).waitFor();
    await stranger.goto('/account');
    await stranger.getByRole('button', { name: 'Sign in' }).waitFor();
  });
});
