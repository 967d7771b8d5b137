import { exposureNames, importFieldNames, memberTypeNames, message, wayNames } from '@mantlet/common';
import type { CriticalTemperatureBasis, Exposure, ImportField, ImportMapping, ImportRowDto, MemberInput } from '@mantlet/common';
import type { ReadRow, RowProblem } from './read-row.js';

/** What an import may write of a member. */
export type Writable = Pick<MemberInput, 'zoneId' | 'memberType' | 'sectionId' | 'grade' | 'lengthMm' | 'quantity' | 'exposure' | 'protectionForm' | 'note'>;
export interface StandingMember extends Writable {
  id: string;
  mark: string;
  basis: CriticalTemperatureBasis;
}
export interface ComparedRow {
  row: number;
  mark: string;
  state: ImportRowDto['state'];
  values: ReadRow['values'];
  problems: RowProblem[];
  changes: ImportRowDto['changes'];
  standing: StandingMember | null;
  /** all that will stand after writing; null for a wrong row */
  target: Writable | null;
  /** set where the row says how the critical temperature comes about */
  basis: CriticalTemperatureBasis | null;
}
export interface Namer {
  zone: (id: string) => string;
  /** the code of the level that a zone lies on */
  levelOf: (zoneId: string) => string;
  section: (id: string) => string;
}

/** Holds a row against the member that bears its mark: what is new, what changes, from what to what. */
export function compareRow(row: ReadRow, standing: StandingMember | null, defaults: ImportMapping['defaults'], namer: Namer): ComparedRow {
  const target = standing ? updated(standing, row) : fresh(row, defaults);
  const missing = standing ? [] : missingFields(row, target);
  const problems = [...row.problems.filter((problem) => !isAnswered(problem, standing, defaults, namer)), ...missing.map((field) => ({ field, reason: message('import.row-needed', { field: importFieldNames[field] }) }))];
  const base = { row: row.row, mark: row.mark, values: row.values, problems, standing, basis: basisOf(row, standing) };
  if (problems.length) return { ...base, state: 'wrong', changes: [], target: null };
  if (!standing) return { ...base, state: 'new', changes: [], target: target as Writable };
  const changes = changesOf(standing, target as Writable, base.basis ?? undefined, namer);
  return { ...base, state: changes.length ? 'changed' : 'unchanged', changes, target: target as Writable };
}

/** A schedule gives a utilisation as a number; that the beam may buckle, known of the member that is there, stays known. */
function basisOf(row: ReadRow, standing: StandingMember | null): CriticalTemperatureBasis | null {
  const given = row.draft.basis ?? null;
  if (given?.way !== 'utilisation' || !standing) return given;
  const before = standing.basis;
  const buckles = 'mayBuckle' in before ? before.mayBuckle : before.way === 'calculated' && before.design.lateralRestraint === 'at-points';
  return buckles ? { ...given, mayBuckle: true } : given;
}

/**
 * What a row alone leaves unclear, the member that is there, or the value for all rows, may answer: which of a level's zones,
 * which faces see fire.
 */
function isAnswered({ reason }: RowProblem, standing: StandingMember | null, defaults: ImportMapping['defaults'], namer: Namer): boolean {
  const zoneId = standing ? standing.zoneId : defaults.zoneId;
  if (reason.code === 'import.row-zone-unclear') return zoneId !== null && namer.levelOf(zoneId) === (reason.params as { level: string }).level;
  return reason.code === 'import.row-faces' && standing?.exposure.arrangement === 'given-faces';
}

function fresh(row: ReadRow, defaults: ImportMapping['defaults']): Partial<Writable> {
  const { draft } = row;
  const arrangement = defaults.exposure && defaults.exposure !== 'given-faces' ? { arrangement: defaults.exposure } : undefined;
  const exposure = draft.exposure ?? arrangement;
  return {
    zoneId: draft.zoneId ?? defaults.zoneId ?? undefined,
    memberType: draft.memberType ?? defaults.memberType ?? undefined,
    sectionId: draft.sectionId,
    grade: draft.grade ?? defaults.grade ?? undefined,
    lengthMm: draft.lengthMm,
    quantity: draft.quantity ?? 1,
    exposure: exposure && { ...exposure, reason: '' },
    protectionForm: draft.protectionForm ?? defaults.protectionForm ?? undefined,
    note: draft.note ?? '',
  } as Partial<Writable>;
}

/** What the row leaves out stays as it is; the faces and reason of an exposure stay where the arrangement does. */
function updated(standing: StandingMember, row: ReadRow): Writable {
  const { draft } = row;
  return {
    zoneId: draft.zoneId ?? standing.zoneId,
    memberType: draft.memberType ?? standing.memberType,
    sectionId: draft.sectionId ?? standing.sectionId,
    grade: draft.grade ?? standing.grade,
    lengthMm: draft.lengthMm ?? standing.lengthMm,
    quantity: draft.quantity ?? standing.quantity,
    exposure: draft.exposure && !sameExposure(draft.exposure, standing.exposure) ? { ...draft.exposure, reason: '' } : standing.exposure,
    protectionForm: draft.protectionForm ?? standing.protectionForm,
    note: draft.note ?? standing.note,
  };
}

const fieldOf: Partial<Record<keyof Writable, ImportField>> = {
  zoneId: 'zone', memberType: 'memberType', sectionId: 'section', grade: 'grade', lengthMm: 'length', exposure: 'exposure', protectionForm: 'protectionForm',
};

/** Fields a new member needs and that neither the row nor the defaults say; one that was said wrongly is no second problem. */
function missingFields(row: ReadRow, target: Partial<Writable>): ImportField[] {
  const wrong = new Set<ImportField>(row.problems.map((problem) => (problem.field === 'level' ? 'zone' : problem.field)));
  return Object.entries(fieldOf).flatMap(([key, field]) => (target[key as keyof Writable] === undefined && !wrong.has(field) ? [field] : []));
}

function sameExposure(a: Pick<Exposure, 'arrangement' | 'faces'>, b: Exposure): boolean {
  const faces = (e: Pick<Exposure, 'faces'>): string => [...(e.faces ?? [])].sort().join();
  return a.arrangement === b.arrangement && (a.arrangement !== 'given-faces' || faces(a) === faces(b));
}

function changesOf(old: StandingMember, target: Writable, basis: CriticalTemperatureBasis | undefined, namer: Namer): ImportRowDto['changes'] {
  const changes: ImportRowDto['changes'] = [];
  const note = <T>(field: ImportField, before: T, after: T, say: (value: T) => string): void => {
    if (JSON.stringify(before) !== JSON.stringify(after)) changes.push({ field, old: say(before), new: say(after) });
  };
  note('zone', old.zoneId, target.zoneId, namer.zone);
  note('memberType', old.memberType, target.memberType, (type) => memberTypeNames[type]);
  note('section', old.sectionId, target.sectionId, namer.section);
  note('grade', old.grade, target.grade, String);
  // a length that differs by the conversion's last digits is the same length
  if (Math.abs(old.lengthMm - target.lengthMm) > 0.001) note('length', old.lengthMm, target.lengthMm, (mm) => `${Number(mm.toFixed(3))} mm`);
  note('quantity', old.quantity, target.quantity, String);
  note('exposure', old.exposure, target.exposure, exposureText);
  note('protectionForm', old.protectionForm, target.protectionForm, String);
  note('note', old.note, target.note, String);
  if (basis && !sameBasis(old.basis, basis)) {
    changes.push({ field: basis.way === 'utilisation' ? 'utilisation' : 'criticalTemperature', old: basisText(old.basis), new: basisText(basis) });
  }
  return changes;
}

/** Key order is no difference: the database keeps its own. */
function sameBasis(a: CriticalTemperatureBasis, b: CriticalTemperatureBasis): boolean {
  if (a.way === 'declared' && b.way === 'declared') return a.temperatureC === b.temperatureC && a.reference === b.reference;
  return a.way === 'utilisation' && b.way === 'utilisation' && a.mu0 === b.mu0 && a.reference === b.reference;
}

const exposureText = (exposure: Exposure): string =>
  exposure.arrangement === 'given-faces' ? `Faces: ${(exposure.faces ?? []).join(', ')}` : exposureNames[exposure.arrangement];

function basisText(basis: CriticalTemperatureBasis): string {
  if (basis.way === 'declared') return `Declared ${basis.temperatureC} °C (${basis.reference})`;
  if (basis.way === 'utilisation') return `Utilisation in fire ${basis.mu0}${basis.mayBuckle ? ', may buckle' : ''} (${basis.reference})`;
  return wayNames[basis.way];
}
