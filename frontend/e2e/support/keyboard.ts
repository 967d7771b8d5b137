import type { Locator, Page } from 'playwright-core';

/** What has the focus, and whether somebody who looks at the page can tell. */
const focusNow = (page: Page): Promise<{ name: string; visible: boolean; inSight: boolean }> =>
  page.evaluate(() => {
    const at = document.activeElement;
    if (!at || at === document.body) return { name: 'nothing', visible: true, inSight: true };
    const name = `${at.tagName.toLowerCase()} “${[at.getAttribute('aria-label') ?? (at as HTMLInputElement).labels?.[0]?.textContent ?? at.textContent, at.getAttribute('role')].join(' ').trim().slice(0, 60)}”`;
    const ring = (element: Element | null | undefined): boolean => {
      if (!element) return false;
      const { outlineStyle, outlineWidth, outlineColor } = getComputedStyle(element);
      return outlineStyle !== 'none' && Number.parseFloat(outlineWidth) >= 2 && !/rgba\(.*, 0\)/.test(outlineColor);
    };
    // components draw it on their frame, a drawing's link on its shape; a heading takes the focus only to be read out
    const shape = at.closest('svg') && (at.closest('g')?.querySelector('.d-zone') ?? at.closest('g')?.querySelector('rect, path, circle'));
    const drawn = shape ? Number.parseFloat(getComputedStyle(shape).strokeWidth) >= 3 : false;
    const frames = [at, at.parentElement, at.parentElement?.parentElement, at.parentElement?.parentElement?.parentElement, at.nextElementSibling];
    const box = at.getBoundingClientRect();
    const points = [[0.5, 0.5], [0.1, 0.5], [0.9, 0.5], [0.5, 0.1], [0.5, 0.9]].map(([x = 0, y = 0]) => document.elementFromPoint(box.left + box.width * x, box.top + box.height * y));
    const inSight = points.some((hit) => hit !== null && (hit === at || at.contains(hit) || hit.contains(at) || frames.includes(hit)));
    return { name, visible: drawn || at.tagName === 'H1' || frames.some(ring), inSight };
  });

/** Goes on with Tab until this has the focus; fails where the focus could not be seen on the way, or stands under something. */
export async function tabTo(page: Page, target: Locator, { most = 120, back = false } = {}): Promise<void> {
  await target.waitFor();
  const unseen: string[] = [];
  for (let steps = 0; steps < most; steps += 1) {
    if (await target.evaluate((element) => element === document.activeElement)) {
      if (unseen.length) throw new Error(`The focus could not be seen on ${[...new Set(unseen)].join('; ')}.`);
      return;
    }
    await page.keyboard.press(back ? 'Shift+Tab' : 'Tab');
    const { name, visible, inSight } = await focusNow(page);
    if (!visible) unseen.push(`${name} (no mark)`);
    if (!inSight) unseen.push(`${name} (out of sight)`);
  }
  throw new Error(`${target.toString()} was not reached in ${most} steps of the Tab key.`);
}
