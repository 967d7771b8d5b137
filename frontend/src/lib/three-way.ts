/**
 * Three versions of one record, compared part by part: as it stood when the form was opened, as typed, and as it stands now.
 * Pure: values in, values out. A part is the smallest thing worth choosing: a field, a list of words, one entry of a list whose entries have names.
 */
export interface Difference {
  /** where it is: "curve.openingFactor", "systems.column" */
  path: string;
  base: unknown;
  mine: unknown;
  theirs: unknown;
  /** who changed it: only I, only they, or both of us and differently */
  by: 'mine' | 'theirs' | 'both';
}
export type Choice = 'mine' | 'theirs';
/** One choice a path; what only one of us changed is chosen for already. */
export type Choices = Readonly<Record<string, Choice>>;

type Fields = Record<string, unknown>;
const isFields = (value: unknown): value is Fields => typeof value === 'object' && value !== null && !Array.isArray(value);
/** An empty field is one thing, whether a form or the server says it: null, nothing at all, no text, no entries. */
const isEmpty = (value: unknown): boolean => value === null || value === undefined || value === '' || (Array.isArray(value) && value.length === 0);

/** The same text for the same value, whatever the order of an object's keys. */
export function canonical(value: unknown): string {
  if (isEmpty(value)) return 'null';
  if (Array.isArray(value)) return `[${value.map(canonical).join(',')}]`;
  if (!isFields(value)) return JSON.stringify(value) ?? 'null';
  const kept = Object.keys(value).sort().filter((key) => !isEmpty(value[key]));
  return `{${kept.map((key) => `${JSON.stringify(key)}:${canonical(value[key])}`).join(',')}}`;
}
export const sameValue = (a: unknown, b: unknown): boolean => canonical(a) === canonical(b);

/** What names an entry of a list, so that it is found again wherever it stands. */
const names = [['memberType'], ['shape', 'orientation', 'periodMin'], ['shape', 'orientation']] as const;
type Name = (typeof names)[number];
const nameOf = (entry: Fields, name: Name): string => name.map((key) => String(entry[key])).join(' ');

/** How the entries of all three lists are named; null where they are not, and the list is one part. */
function namedBy(lists: readonly unknown[][]): Name | null {
  const fits = (name: Name) => lists.every((list) => {
    const entries = list.filter(isFields).filter((entry) => name.every((key) => !isEmpty(entry[key])));
    return entries.length === list.length && new Set(entries.map((entry) => nameOf(entry, name))).size === list.length;
  });
  return names.find(fits) ?? null;
}

interface Triple { base: unknown; mine: unknown; theirs: unknown }
const three = ({ base, mine, theirs }: Triple): unknown[] => [base, mine, theirs];

/** What says which kind of thing an object is; half of one kind and half of another is neither. */
const kinds = ['kind', 'form', 'policy', 'arrangement'] as const;
const ofOneKind = (mine: Fields, theirs: Fields): boolean => kinds.every((key) => mine[key] === theirs[key]);

/** The parts of three values at one place, by the step that leads to each; null where the value is itself a part. */
function partsOf(triple: Triple, atTop: boolean): [step: string, part: Triple][] | null {
  const given = three(triple).filter((value) => !isEmpty(value));
  const { mine, theirs } = triple;
  if (isFields(mine) && isFields(theirs) && given.every(isFields)) {
    if (!atTop && !ofOneKind(mine, theirs)) return null;
    const of = (value: unknown, key: string) => (isFields(value) ? value[key] : undefined);
    return [...new Set(given.flatMap(Object.keys))].map((key) => [key, { base: of(triple.base, key), mine: of(triple.mine, key), theirs: of(triple.theirs, key) }]);
  }
  if (given.length === 0 || !given.every(Array.isArray)) return null;
  const name = namedBy(given);
  if (!name) return null;
  const of = (value: unknown, key: string) => (Array.isArray(value) ? (value as Fields[]).find((entry) => nameOf(entry, name) === key) : undefined);
  const keys = new Set((given as Fields[][]).flatMap((list) => list.map((entry) => nameOf(entry, name))));
  return [...keys].map((key) => [key, { base: of(triple.base, key), mine: of(triple.mine, key), theirs: of(triple.theirs, key) }]);
}

function changedBy({ base, mine, theirs }: Triple): Difference['by'] | null {
  if (sameValue(mine, theirs)) return null;
  if (sameValue(base, theirs)) return 'mine';
  return sameValue(base, mine) ? 'theirs' : 'both';
}

/** The parts in which mine and theirs differ, in the order of the form. An entry of a list is one part, whatever it holds. */
export function differencesOf(base: unknown, mine: unknown, theirs: unknown, path = '', inList = false): Difference[] {
  const triple = { base, mine, theirs };
  const by = changedBy(triple);
  if (!by) return [];
  const parts = inList ? null : partsOf(triple, path === '');
  if (!parts) return [{ path, ...triple, by }];
  const list = three(triple).some(Array.isArray);
  return parts.flatMap(([step, part]) => differencesOf(part.base, part.mine, part.theirs, path ? `${path}.${step}` : step, list));
}

/** What only one of us changed is theirs or mine without asking; what both changed has no choice yet. */
export const firstChoices = (differences: readonly Difference[]): Choices =>
  Object.fromEntries(differences.flatMap(({ path, by }) => (by === 'both' ? [] : [[path, by]])));
export const undecided = (differences: readonly Difference[], choices: Choices): Difference[] => differences.filter(({ path }) => !choices[path]);

/** Both versions as one: theirs, with mine wherever mine was chosen. Gives a new value; the given ones stay as they are. */
export function mergeOf<T>(base: unknown, mine: T, theirs: T, choices: Choices, path = '', inList = false): T {
  const triple = { base, mine, theirs };
  if (!changedBy(triple)) return theirs;
  const parts = inList ? null : partsOf(triple, path === '');
  if (!parts) return choices[path] === 'mine' ? mine : theirs;
  const list = three(triple).some(Array.isArray);
  const merged = parts.map(([step, part]) => [step, mergeOf(part.base, part.mine, part.theirs, choices, path ? `${path}.${step}` : step, list)] as const);
  if (list) return merged.map(([, entry]) => entry).filter((entry) => entry !== undefined) as T;
  return Object.fromEntries(merged.filter(([, part]) => part !== undefined)) as T;
}
