import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import type { Page } from 'playwright-core';

/** The rules of WCAG 2.2 A and AA that axe-core checks, without its experimental one on names that differ from what is seen. */
const rules = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];
const source = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');
interface Axe { run: (context: unknown, options: unknown) => Promise<{ violations: { id: string; help: string; nodes: { target: unknown[]; failureSummary?: string }[] }[] }> }

/** What axe finds on the page as it stands, a line each. What an open drawer or dialog covers was looked at before it opened. */
export async function violations(page: Page): Promise<string[]> {
  // the page's own policy refuses an added script element; evaluating is not one
  if (!(await page.evaluate(() => 'axe' in globalThis))) await page.evaluate(source);
  const found = await page.evaluate(
    async (tags) => {
      const open = [...document.querySelectorAll('.ant-drawer, .ant-modal, .ant-dropdown')].filter((layer) => layer.checkVisibility());
      const layer = open.at(-1);
      const found = await (globalThis as unknown as { axe: Axe }).axe.run(layer ?? document, { resultTypes: ['violations'], runOnly: { type: 'tag', values: tags }, rules: { 'label-content-name-mismatch': { enabled: false } } });
      return found.violations;
    },
    rules,
  );
  return found.map((v) => `${v.id}: ${v.help} (${v.nodes.length}), first at ${String(v.nodes[0]?.target)}: ${v.nodes[0]?.failureSummary ?? ''}`);
}
