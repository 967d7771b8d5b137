import { message } from '@mantlet/common';
import { plainWords } from './words.js';
import { read, refuse } from './numbers.js';
import type { Reading } from './numbers.js';

export interface KnownZone { id: string; code: string; name: string; levelId: string }
export interface KnownLevel { id: string; code: string; name: string }
export interface KnownPlaces { zones: readonly KnownZone[]; levels: readonly KnownLevel[] }

/** By code first, then by name; letters' case and punctuation do not matter unless two would be meant. */
function matching<T extends { code: string; name: string }>(text: string, known: readonly T[]): T[] {
  const exact = known.filter((k) => k.code === text);
  if (exact.length) return exact;
  const words = plainWords(text);
  if (!words) return [];
  const byCode = known.filter((k) => plainWords(k.code) === words);
  return byCode.length ? byCode : known.filter((k) => plainWords(k.name) === words);
}

export function readLevel(text: string, places: KnownPlaces): Reading<KnownLevel> {
  const [level] = matching(text, places.levels);
  return level ? read(level) : refuse(message('import.row-unknown-place', { what: 'level', text, known: places.levels.map((l) => l.code) }));
}

/**
 * The zone of a row from its zone cell, its level cell, or both. A level alone says the zone where it has just one.
 * Null where the row says neither.
 */
export function readZone(zoneText: string, level: KnownLevel | null, places: KnownPlaces): Reading<KnownZone> | null {
  if (!zoneText) return level ? zoneOfLevel(level, places) : null;
  const found = matching(zoneText, places.zones);
  if (!found.length) return refuse(message('import.row-unknown-place', { what: 'zone', text: zoneText, known: places.zones.map((z) => z.code) }));
  const here = level ? found.filter((zone) => zone.levelId === level.id) : found;
  const [zone] = here;
  if (!zone) return refuse(message('import.row-zone-elsewhere', { zone: found[0]!.code, level: levelCode(found[0]!, places), given: level!.code }));
  return here.length > 1 ? refuse(message('import.row-zone-several', { text: zoneText, zones: here.map((z) => z.code) })) : read(zone);
}

function zoneOfLevel(level: KnownLevel, places: KnownPlaces): Reading<KnownZone> {
  const zones = places.zones.filter((zone) => zone.levelId === level.id);
  return zones.length === 1 ? read(zones[0]!) : refuse(message('import.row-zone-unclear', { level: level.code, zones: zones.map((z) => z.code) }));
}

const levelCode = (zone: KnownZone, places: KnownPlaces): string => places.levels.find((level) => level.id === zone.levelId)?.code ?? '';
