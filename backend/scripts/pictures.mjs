/* global window, document -- what is evaluated in the page */
/**
 * npm run pictures: takes the guides' pictures from the demo as it stands after a fresh `npm start`, into docs/guide/pictures.
 * Reads MANTLET_PICTURES_URL (http://127.0.0.1:4700 unless given) and CHROMIUM_PATH. Changes nothing in the demo.
 */
import { mkdirSync, readFileSync, statSync } from 'node:fs';
import { createRequire } from 'node:module';
import path from 'node:path';
import { at } from './lib/paths.mjs';

const require = createRequire(path.join(at('frontend'), 'package.json'));
const { chromium } = require('playwright-core');

const base = process.env.MANTLET_PICTURES_URL ?? 'http://127.0.0.1:4700';
const folder = at('docs/guide/pictures');
const accounts = JSON.parse(readFileSync(at('seeds/demo/accounts.json'), 'utf8'));
const mostBytes = 120_000;
const desk = { width: 1200, height: 640 };
const phone = { width: 390, height: 760 };

/** name, whose account, address (:p is the project), and what is done before the picture is taken */
const pictures = [
  { name: 'building', role: 'Fire engineer', to: '/projects/:p', size: { width: 1200, height: 560 } },
  { name: 'zones', role: 'Fire engineer', to: '/projects/:p/zones' },
  { name: 'zone-form', role: 'Fire engineer', to: '/projects/:p/zones', act: (page) => page.getByRole('button', { name: /^Edit zone/ }).first().click() },
  { name: 'basis', role: 'Fire engineer', to: '/projects/:p/team', act: (page) => page.getByRole('heading', { name: 'Design basis' }).evaluate((h) => h.closest('section').scrollIntoView()) },
  { name: 'open-members', role: 'Structural engineer', to: '/projects/:p/members?open=true' },
  { name: 'member', role: 'Structural engineer', to: '/projects/:p/members', act: openMember },
  { name: 'protection-form', role: 'Specifier', to: '/projects/:p/zones', act: (page) => page.getByRole('button', { name: /^Protection of zone/ }).first().click() },
  { name: 'target', role: 'Specifier', to: '/projects/:p/zones', act: (page) => page.getByRole('button', { name: 'Target of Z12' }).click() },
  { name: 'schedule', role: 'Specifier', to: '/projects/:p/schedule' },
  { name: 'revision', role: 'Contractor', to: '/projects/:p/schedule', act: (page) => page.getByRole('link', { name: 'P01', exact: true }).click() },
  { name: 'site', role: 'Contractor', to: '/projects/:p/site' },
  { name: 'site-phone', role: 'Contractor', to: '/projects/:p/site', size: phone, act: (page) => page.locator('.mt-site-zone').first().evaluate((zone) => { window.scrollTo(0, zone.getBoundingClientRect().top + window.scrollY - 190); }) },
  { name: 'accounts', role: 'Administrator', to: '/accounts' },
  { name: 'first-visit', role: 'Administrator', to: '/projects', size: { width: 1200, height: 420 } },
  { name: 'account', role: 'Administrator', to: '/account' },
];

async function openMember(page) {
  await page.getByLabel('Search').fill('L0-TB01');
  await page.getByRole('link', { name: 'L0-TB01', exact: true }).click();
  await page.getByRole('link', { name: 'All members' }).waitFor();
}

async function signIn(page, role) {
  const account = accounts.find((one) => one.role.startsWith(role));
  if (!account) throw new Error(`No demo account for ${role}.`);
  await page.goto('/');
  await page.getByLabel('E-mail').fill(account.email);
  await page.getByLabel('Password', { exact: true }).fill(account.password);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.getByRole('link', { name: 'Mantlet, all projects' }).waitFor();
}

async function settle(page) {
  await page.getByRole('heading', { level: 1 }).waitFor();
  await page.getByText(/^Loading .*…$/).first().waitFor({ state: 'hidden' });
  await page.evaluate(() => document.fonts.ready);
  await page.waitForTimeout(700);
}

async function take(browser, role, wanted) {
  const context = await browser.newContext({ baseURL: base, viewport: desk, locale: 'en-GB', colorScheme: 'light', reducedMotion: 'reduce' });
  const page = await context.newPage();
  await signIn(page, role);
  const projects = await (await context.request.get('/api/projects')).json();
  for (const { name, to, act, size } of wanted) {
    await page.setViewportSize(size ?? desk);
    await page.goto(to.replace(':p', projects[0]?.id ?? ''));
    await settle(page);
    if (act) await act(page).then(() => settle(page));
    const file = path.join(folder, `${name}.png`);
    await page.screenshot({ path: file });
    const bytes = statSync(file).size;
    console.log(`${name}.png ${Math.round(bytes / 1000)} kB`);
    if (bytes > mostBytes) throw new Error(`${name}.png has ${bytes} bytes; a picture of a guide has at most ${mostBytes}.`);
  }
  await context.close();
}

mkdirSync(folder, { recursive: true });
const browser = await chromium.launch({ executablePath: process.env.CHROMIUM_PATH ?? '/usr/bin/chromium', args: ['--no-sandbox', '--disable-dev-shm-usage'] });
try {
  for (const role of new Set(pictures.map((one) => one.role))) await take(browser, role, pictures.filter((one) => one.role === role));
} finally {
  await browser.close();
}
