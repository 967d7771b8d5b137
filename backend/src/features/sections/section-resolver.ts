import { normaliseDesignation, suggestDesignations } from '../../calc/index.js';
import type { Section } from './section.entity.js';

/** Finds sections by the names people write in schedules. */
export interface SectionResolver {
  /** by any usual spelling of its designation or of another of its names; null where there is none */
  find(text: string): Section | null;
  /** the nearest designations to a name that was not found, at most five, nearest first */
  suggest(text: string): string[];
}

export function makeResolver(sections: readonly Section[]): SectionResolver {
  const byKey = new Map<string, Section>();
  // a designation is sure of its key; another name gets it only where no designation has it
  for (const section of sections) byKey.set(section.designationKey, section);
  for (const section of sections) {
    for (const name of section.otherNames) {
      const key = normaliseDesignation(name);
      if (!byKey.has(key)) byKey.set(key, section);
    }
  }
  const designations = sections.map((section) => section.designation);
  return {
    find: (text) => byKey.get(normaliseDesignation(text)) ?? null,
    suggest: (text) => (normaliseDesignation(text) ? suggestDesignations(text, designations, 5) : []),
  };
}
