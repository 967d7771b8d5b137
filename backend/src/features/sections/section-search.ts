import { sectionFamilies } from '@mantlet/common';
import type { SectionFamily } from '@mantlet/common';
import { normaliseDesignation } from '../../calc/index.js';
import type { Section } from './section.entity.js';

/** Of a section, what finding and ordering need. */
export type SectionName = Pick<Section, 'id' | 'projectId' | 'family' | 'designation' | 'designationKey' | 'otherNames'>;

const orderOfFamily = new Map<SectionFamily, number>(sectionFamilies.map((family, index) => [family, index]));

/** The sections that a text may mean, in the order of the standards' tables; those whose name begins with it first. */
export function searchSections(sections: readonly SectionName[], search: string | undefined): SectionName[] {
  const ranked = sections.flatMap((section) => {
    const rank = search ? rankOf(section, search) : 0;
    return rank === null ? [] : [{ section, rank, numbers: numbersOf(section.designationKey) }];
  });
  ranked.sort(
    (a, b) => a.rank - b.rank
      || own(a.section) - own(b.section)
      || (orderOfFamily.get(a.section.family) ?? 0) - (orderOfFamily.get(b.section.family) ?? 0)
      || compareNumbers(a.numbers, b.numbers)
      || a.section.designation.localeCompare(b.section.designation, 'en'),
  );
  return ranked.map((entry) => entry.section);
}

/** the project's own sections come before the catalogue's */
const own = (section: SectionName): number => (section.projectId === null ? 1 : 0);

/** 0 the very section, 1 begins with the text, 2 holds it; null not at all */
function rankOf(section: SectionName, search: string): number | null {
  const key = normaliseDesignation(search);
  const keys = [section.designationKey, ...section.otherNames.map(normaliseDesignation)];
  if (key !== '' && keys.includes(key)) return 0;
  if (key !== '' && keys.some((one) => one.startsWith(key))) return 1;
  const plain = search.trim().toUpperCase();
  const held = (key !== '' && keys.some((one) => one.includes(key)))
    || [section.designation, ...section.otherNames].some((name) => name.toUpperCase().includes(plain));
  return held ? 2 : null;
}

function numbersOf(key: string): number[] {
  return (key.match(/\d+(?:\.\d+)?/g) ?? []).map(Number);
}

function compareNumbers(a: readonly number[], b: readonly number[]): number {
  for (let i = 0; i < Math.max(a.length, b.length); i += 1) {
    const apart = (a[i] ?? -1) - (b[i] ?? -1);
    if (apart !== 0) return apart;
  }
  return 0;
}
