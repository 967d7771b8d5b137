import { readFile, readdir } from 'node:fs/promises';
import path from 'node:path';
import { isDeepStrictEqual } from 'node:util';
import { IsNull } from 'typeorm';
import type { DataSource } from 'typeorm';
import { normaliseDesignation, parseCatalogue, sectionProperties } from '../calc/index.js';
import type { CatalogueSection } from '../calc/index.js';
import { Section } from '../features/sections/section.entity.js';

type CatalogueRow = Pick<Section, 'family' | 'designation' | 'designationKey' | 'otherNames' | 'standard' | 'shape' | 'properties'>;
const BATCH = 500;

/** The same place seen from the sources and from the build: both lie two folders below the package. */
const catalogueFolder = path.resolve(import.meta.dirname, '../../../seeds/sections');

/**
 * Brings the shared section catalogue in line with its data files; properties are computed here, from the dimensions.
 * Returns how many sections were added or changed. One that the files no longer hold stays: members may rest on it.
 */
export async function seedCatalogue(dataSource: DataSource): Promise<number> {
  const wanted = await readCatalogue();
  return dataSource.transaction(async (manager) => {
    // two servers that start at once take turns
    await manager.query('SELECT pg_advisory_xact_lock(72001)');
    const standing = await manager.find(Section, { where: { projectId: IsNull() } });
    const byKey = new Map(standing.map((section) => [section.designationKey, section]));
    const due = wanted.filter((row) => !isSame(byKey.get(row.designationKey), row));
    for (let at = 0; at < due.length; at += BATCH) {
      await manager.upsert(Section, due.slice(at, at + BATCH), { conflictPaths: ['designationKey'], indexPredicate: 'project_id IS NULL' });
    }
    return due.length;
  });
}

/** Throws where two sections of the files would answer to one name. */
async function readCatalogue(): Promise<CatalogueRow[]> {
  const names = (await readdir(catalogueFolder)).filter((name) => name.endsWith('.csv')).sort();
  const files = await Promise.all(names.map(async (name) => ({ name, text: await readFile(path.join(catalogueFolder, name), 'utf8') })));
  const rows = new Map<string, CatalogueRow>();
  for (const section of parseCatalogue(files)) {
    const row = toRow(section);
    const other = rows.get(row.designationKey);
    if (other) throw new Error(`The section catalogue names both ${other.designation} and ${row.designation}, which read alike.`);
    rows.set(row.designationKey, row);
  }
  return [...rows.values()];
}

function toRow(section: CatalogueSection): CatalogueRow {
  const { family, designation, otherNames, standard, shape, massKgPerM } = section;
  return {
    family, designation, designationKey: normaliseDesignation(designation), otherNames, standard, shape,
    properties: { ...sectionProperties(shape), massKgPerM },
  };
}

function isSame(standing: Section | undefined, row: CatalogueRow): boolean {
  if (!standing) return false;
  const { family, designation, designationKey, otherNames, standard, shape, properties } = standing;
  return isDeepStrictEqual({ family, designation, designationKey, otherNames, standard, shape, properties }, row);
}
