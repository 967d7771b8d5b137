import type { OpenItemDto, Role } from '@mantlet/common';

/** An open item with the number it has on the drawing and in the list. */
export interface Keynote { number: number; item: OpenItemDto; mine: boolean }

/** Numbered as they are read: what waits on the reader first, then as they come, which is in the order of who must act. */
export function keynotesOf(items: readonly OpenItemDto[], held: readonly Role[]): Keynote[] {
  const mine = (item: OpenItemDto) => held.includes(item.role);
  const others = items.filter((item) => !mine(item));
  const byRole = [...new Set(others.map((item) => item.role))].flatMap((role) => others.filter((item) => item.role === role));
  return [...items.filter(mine), ...byRole].map((item, i) => ({ number: i + 1, item, mine: mine(item) }));
}

/** Zone id → numbers on it. What belongs to no zone stands in the list only. */
export function numbersByZone(keynotes: readonly Keynote[]): Map<string, number[]> {
  const byZone = new Map<string, number[]>();
  for (const { number, item } of keynotes) if (item.zoneId) byZone.set(item.zoneId, [...(byZone.get(item.zoneId) ?? []), number]);
  return byZone;
}

/** The list's parts: the reader's own, then one for each role that must act, so that the numbers rise through the list. */
export function groupsOf(keynotes: readonly Keynote[]): { role: Role | 'you'; keynotes: Keynote[] }[] {
  const mine = keynotes.filter((k) => k.mine);
  const roles = [...new Set(keynotes.filter((k) => !k.mine).map((k) => k.item.role))];
  const others = roles.map((role) => ({ role, keynotes: keynotes.filter((k) => !k.mine && k.item.role === role) }));
  return [{ role: 'you' as const, keynotes: mine }, ...others].filter((group) => group.keynotes.length > 0);
}
