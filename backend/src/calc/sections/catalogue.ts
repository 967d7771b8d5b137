import { sectionFamilies, sentence } from '@mantlet/common';
import type { SectionFamily, SectionShape } from '@mantlet/common';
import { determineSectionProperties, massOfArea } from './properties.js';

export interface CatalogueSection {
  family: SectionFamily;
  designation: string;
  otherNames: string[];
  standard: string;
  shape: SectionShape;
  /** what a metre weighs, for quantities only: on the nominal wall where the properties use a thinner design wall (ASTM A500) */
  massKgPerM: number;
}

type Row = { where: string; text: (column: string) => string; number: (column: string) => number };

/** How the columns of each file make a shape; the file's name without .csv says which. */
const readers: Record<string, (row: Row, wall: string) => SectionShape> = {
  i: (r) => ({ kind: 'i', hMm: r.number('h_mm'), bMm: r.number('b_mm'), twMm: r.number('tw_mm'), tfMm: r.number('tf_mm'), rootRadiusMm: r.number('root_radius_mm') }),
  tee: (r) => ({ kind: 'tee', hMm: r.number('h_mm'), bMm: r.number('b_mm'), twMm: r.number('tw_mm'), tfMm: r.number('tf_mm'), rootRadiusMm: r.number('root_radius_mm') }),
  channel: (r) => ({
    kind: 'channel', hMm: r.number('h_mm'), bMm: r.number('b_mm'), twMm: r.number('tw_mm'), tfMm: r.number('tf_mm'),
    rootRadiusMm: r.number('root_radius_mm'), toeRadiusMm: r.number('toe_radius_mm'), flangeSlope: r.number('flange_slope'),
  }),
  angle: (r) => ({ kind: 'angle', hMm: r.number('h_mm'), bMm: r.number('b_mm'), tMm: r.number('t_mm'), rootRadiusMm: r.number('root_radius_mm'), toeRadiusMm: r.number('toe_radius_mm') }),
  'rectangular-hollow': (r, wall) => ({
    kind: 'rectangular-hollow', hMm: r.number('h_mm'), bMm: r.number('b_mm'), tMm: r.number(wall),
    outerRadiusMm: r.number('outer_radius_by_t') * r.number(wall), innerRadiusMm: r.number('inner_radius_by_t') * r.number(wall),
  }),
  'circular-hollow': (r, wall) => ({ kind: 'circular-hollow', dMm: r.number('d_mm'), tMm: r.number(wall) }),
};

/**
 * The section catalogue from its files' texts (comma-separated, one heading line, no quoting; lengths in mm; other names
 * separated by semicolons). Throws an Error naming file, line and column where a file is not as it should be.
 */
export function parseCatalogue(files: { name: string; text: string }[]): CatalogueSection[] {
  return files.flatMap(({ name, text }) => {
    const read = readers[name.replace(/^.*\//, '').replace(/\.csv$/, '')];
    if (!read) throw new Error(`${name} is not a file of the section catalogue.`);
    const [heading, ...lines] = text.split(/\r?\n/).filter((line) => line.trim() !== '');
    const columns = (heading ?? '').split(',');
    return lines.map((line, i) => toSection(rowOf(`${name} line ${i + 2}`, columns, line.split(',')), read));
  });
}

function toSection(row: Row, read: (row: Row, wall: string) => SectionShape): CatalogueSection {
  const shape = read(row, 't_design_mm');
  const hollow = shape.kind === 'rectangular-hollow' || shape.kind === 'circular-hollow';
  const onNominalWall = hollow && row.number('t_mm') !== row.number('t_design_mm') ? read(row, 't_mm') : shape;
  return {
    family: row.text('family') as SectionFamily,
    designation: row.text('designation'),
    otherNames: row.text('other_names').split(';').map((n) => n.trim()).filter(Boolean),
    standard: row.text('standard'),
    shape,
    massKgPerM: massOfArea(areaOf(onNominalWall, row.where)),
  };
}

function areaOf(shape: SectionShape, where: string): number {
  const properties = determineSectionProperties(shape);
  if (!properties.ok) throw new Error(`${where}: ${sentence(properties.reason)}`);
  return properties.value.areaMm2;
}

function rowOf(where: string, columns: string[], cells: string[]): Row {
  if (cells.length !== columns.length) throw new Error(`${where} has ${cells.length} cells for ${columns.length} columns.`);
  const text = (column: string) => {
    const at = columns.indexOf(column);
    if (at < 0) throw new Error(`${where}: there is no column ${column}.`);
    return cells[at]!.trim();
  };
  const number = (column: string) => {
    const value = text(column) === '' ? NaN : Number(text(column));
    if (!Number.isFinite(value)) throw new Error(`${where}: ${column} is not a number.`);
    return value;
  };
  if (!(sectionFamilies as readonly string[]).includes(text('family'))) throw new Error(`${where}: there is no family ${text('family')}.`);
  if (text('designation') === '') throw new Error(`${where}: the designation is missing.`);
  return { where, text, number };
}
