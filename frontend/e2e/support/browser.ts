import { readFileSync } from 'node:fs';
import path from 'node:path';
import { chromium } from 'playwright-core';
import type { Browser, BrowserContext, ConsoleMessage, Locator, Page } from 'playwright-core';

function required(name: string): string {
  const value = process.env[name];
  if (!value) throw new Error(`${name} is not set: run the journeys through \`npm test -- e2e\`.`);
  return value;
}

interface Account { name: string; email: string; password: string; role: string }
const accounts = JSON.parse(readFileSync(path.resolve(import.meta.dirname, '../../../seeds/demo/accounts.json'), 'utf8')) as Account[];

/** The demo's account whose role begins with this. */
export function account(role: string): Account {
  const found = accounts.find((one) => one.role.startsWith(role));
  if (!found) throw new Error(`No demo account for ${role}.`);
  return found;
}

/** One browser for a file of journeys; a context of its own for each person, so that several are signed in side by side. */
export class People {
  private readonly contexts: BrowserContext[] = [];
  private constructor(private readonly browser: Browser) {}

  static async start(): Promise<People> {
    return new People(await chromium.launch({ executablePath: required('CHROMIUM_PATH'), args: ['--no-sandbox', '--disable-dev-shm-usage'] }));
  }

  async stop(): Promise<void> {
    await Promise.all(this.contexts.map((context) => context.close()));
    await this.browser.close();
  }

  /** A fresh visitor. What any of their pages throws, refuses or complains of is a fault. */
  async visitor(options: { empty?: boolean; dark?: boolean } = {}): Promise<Page> {
    const context = await this.browser.newContext({
      baseURL: required(options.empty ? 'MANTLET_E2E_EMPTY_URL' : 'MANTLET_E2E_URL'), viewport: { width: 1440, height: 920 }, locale: 'en-GB',
      acceptDownloads: true, colorScheme: options.dark ? 'dark' : 'light',
      // some people's systems ask for stillness; it also spares the waiting
      reducedMotion: 'reduce',
    });
    this.contexts.push(context);
    context.setDefaultTimeout(20_000);
    context.on('page', watch);
    return context.newPage();
  }

  /** Somebody of the demo's team, signed in by the form and on the project's first page. */
  async person(role: string, options: { dark?: boolean } = {}): Promise<Page> {
    const page = await this.visitor(options);
    await signIn(page, account(role));
    await page.getByRole('link', { name: 'Marrow Gate Civic Library' }).first().click();
    await page.getByRole('link', { name: 'All projects', exact: true }).waitFor();
    return page;
  }
}

/** What pages threw or wrote to the console as an error, and where the server failed; a journey's last step asks for none. */
export const faults: Error[] = [];

/** Answers such as 401 and 409 belong to what is tried; what the page's own policy refuses, and what React complains of, does not. */
const isFault = (line: ConsoleMessage): boolean => line.type() === 'error' && !line.text().startsWith('Failed to load resource');

function watch(page: Page): void {
  page.on('pageerror', (error) => faults.push(error));
  page.on('console', (line) => { if (isFault(line)) faults.push(new Error(`${page.url()} wrote: ${line.text()}`)); });
  page.on('response', (response) => {
    if (response.status() >= 500) faults.push(new Error(`${response.request().method()} ${response.url()} answered ${response.status()}`));
  });
}

export async function signIn(page: Page, { email, password }: Pick<Account, 'email' | 'password'>): Promise<void> {
  await page.goto('/');
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password', { exact: true }).fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.getByRole('link', { name: 'Mantlet, all projects' }).waitFor();
}

/** Goes to a page of the project by the list at the left. */
export async function goTo(page: Page, name: string): Promise<void> {
  const link = page.getByRole('navigation', { name: 'Pages' }).getByRole('link', { name: new RegExp(`^${name}`) });
  await link.click();
  // the old page stays until the new one is there
  await link.and(page.locator('[aria-current=page]')).waitFor();
  await settled(page);
}

/** Nothing is being fetched that the page waits for. (The stream of changes stays open, so that the network is never idle.) */
export async function settled(page: Page): Promise<void> {
  await heading(page).waitFor();
  await page.locator('main[aria-busy=true], .mt-state-loading, [role=grid][aria-busy=true]').first().waitFor({ state: 'detached' });
  await page.evaluate(() => document.fonts.ready.then(() => undefined));
}

/** Signs out by the menu of the strip; the sign-in page is what is left. */
export async function signOut(page: Page): Promise<void> {
  await page.locator('.mt-strip-who').click();
  await page.getByRole('menuitem', { name: 'Sign out' }).click();
  await page.getByRole('button', { name: 'Sign in' }).waitFor();
}

/** Opens a select by its label and takes the choice with this text. */
export async function choose(page: Page, within: Page | Locator, label: string | RegExp, text: string | RegExp): Promise<void> {
  await within.getByRole('combobox', { name: label }).click();
  await page.locator('.ant-select-dropdown:visible').getByTitle(text, { exact: true }).click();
  await within.locator('.ant-select').filter({ has: page.getByRole('combobox', { name: label }) }).filter({ hasText: text }).waitFor();
}

export const heading = (page: Page): Locator => page.getByRole('heading', { level: 1 });

/** The sheet of a member, found by its mark in the list. */
export async function openMember(page: Page, mark: string): Promise<void> {
  await goTo(page, 'Members');
  await page.getByLabel('Search').fill(mark);
  await page.getByRole('link', { name: mark, exact: true }).click();
  await page.getByRole('link', { name: 'All members' }).waitFor();
}
