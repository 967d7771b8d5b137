import type { Page } from 'playwright-core';

/**
 * What does not fit the page at its present width, a line each: the page itself scrolling sideways, something standing out of it
 * where nothing scrolls to it, and text cut off without a sign. Tables and drawings may scroll in a frame of their own (WCAG 1.4.10).
 */
export const misfits = (page: Page): Promise<string[]> =>
  page.evaluate(() => {
    const width = document.documentElement.clientWidth;
    const found: string[] = [];
    const name = (element: Element): string => `${element.tagName.toLowerCase()}.${element.getAttribute('class') ?? ''} “${(element.textContent ?? '').slice(0, 40)}”`;
    if (document.documentElement.scrollWidth > width) found.push(`the page is ${document.documentElement.scrollWidth} px wide in ${width}`);
    const reached = (element: Element): boolean => {
      for (let at: Element | null = element; at; at = at.parentElement) {
        const style = getComputedStyle(at);
        if (/(auto|scroll)/.test(style.overflowX) && at.scrollWidth > at.clientWidth) return true;
        // a head that stands still is moved along with the body below it
        if (at.classList.contains('ant-table-header')) return true;
        if (style.clipPath !== 'none' || (style.overflowX === 'hidden' && style.textOverflow === 'ellipsis')) return true;
      }
      return false;
    };
    for (const element of document.querySelectorAll<HTMLElement>('body *')) {
      if (element.closest('svg') && element.tagName !== 'svg') continue;
      const box = element.getBoundingClientRect();
      if (box.width === 0 || box.height === 0 || !element.checkVisibility({ opacityProperty: true, visibilityProperty: true })) continue;
      const style = getComputedStyle(element);
      const out = box.right > width + 1 || (box.left < -1 && box.right > 1);
      if (out && !reached(element)) found.push(`stands out of the page: ${name(element)} (${Math.round(box.left)} to ${Math.round(box.right)})`);
      const ownText = [...element.childNodes].some((node) => node.nodeType === Node.TEXT_NODE && (node.textContent ?? '').trim() !== '');
      const cut = element.scrollWidth > element.clientWidth + 1 && style.overflowX === 'hidden' && style.textOverflow !== 'ellipsis' && element.clientWidth > 1;
      if (ownText && cut) found.push(`is cut off: ${name(element)} (${element.scrollWidth} in ${element.clientWidth})`);
    }
    return [...new Set(found)].slice(0, 8);
  });
