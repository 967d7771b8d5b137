import { describe, expect, it } from 'vitest';
import { differencesOf, firstChoices, mergeOf, sameValue, undecided } from './three-way.js';
import type { Choices } from './three-way.js';

const zone = { code: 'Z1', periodMin: 60, curve: { kind: 'standard' }, reference: '' };
const by = (base: unknown, mine: unknown, theirs: unknown) => Object.fromEntries(differencesOf(base, mine, theirs).map((d) => [d.path, d.by]));
const all = (base: object, mine: object, theirs: object, choice: 'mine' | 'theirs'): Choices => Object.fromEntries(differencesOf(base, mine, theirs).map((d) => [d.path, choice]));

describe('one value, three versions', () => {
  // every way three versions of one field can agree or differ: equal letters are equal values
  it.each([
    ['aaa', {}], ['aba', { x: 'mine' }], ['aab', { x: 'theirs' }], ['abb', {}], ['abc', { x: 'both' }],
  ] as const)('%s', (letters, expected) => {
    const [base, mine, theirs] = [...letters].map((x) => ({ x }));
    expect(by(base, mine, theirs)).toEqual(expected);
  });
  it('an empty field is one thing, however it is written', () => {
    for (const a of [null, undefined, '', []]) for (const b of [null, undefined, '', []]) expect(sameValue({ x: a }, { x: b })).toBe(true);
    for (const filled of [0, false, ' ', [0], 'null']) expect(sameValue({ x: filled }, { x: null })).toBe(false);
    expect(sameValue({ a: 1, b: 2 }, { b: 2, a: 1 })).toBe(true);
    expect(sameValue(['a', 'b'], ['b', 'a'])).toBe(false);
  });
  it('parts of a record are compared one by one', () => {
    expect(by({ a: { b: 1, c: 1 } }, { a: { b: 2, c: 1 } }, { a: { b: 1, c: 3 } })).toEqual({ 'a.b': 'mine', 'a.c': 'theirs' });
  });
  it('things of two kinds are compared whole: half of each would be neither', () => {
    const mine = { ...zone, curve: { kind: 'parametric', openingFactor: 0.04 } };
    const theirs = { ...zone, curve: { kind: 'hydrocarbon' } };
    expect(by(zone, mine, theirs)).toEqual({ curve: 'both' });
    expect(mergeOf(zone, mine, theirs, { curve: 'mine' }).curve).toEqual(mine.curve);
    expect(mergeOf(zone, mine, theirs, { curve: 'theirs' }).curve).toEqual(theirs.curve);
  });
  it('what one of us removed and the other changed is one choice', () => {
    const base = { leading: { category: 'B', axialKn: 10 } };
    expect(by(base, { leading: { category: 'B', axialKn: 12 } }, { leading: null })).toEqual({ leading: 'both' });
  });
});

describe('lists', () => {
  const systems = (beam: string | null, column: string | null) => ({ systems: [{ memberType: 'beam', productId: beam }, { memberType: 'column', productId: column }] });
  it('entries with a name are found again wherever they stand', () => {
    const theirs = { systems: [...systems('a', 'y').systems].reverse() };
    expect(by(systems('a', 'b'), systems('x', 'b'), theirs)).toEqual({ 'systems.beam': 'mine', 'systems.column': 'theirs' });
    const merged = mergeOf(systems('a', 'b'), systems('x', 'b'), theirs, { 'systems.beam': 'mine', 'systems.column': 'theirs' });
    expect(merged).toEqual(systems('x', 'y'));
  });
  it('an added entry is added, a removed one removed', () => {
    const table = (periodMin: number, n: number) => ({ shape: 'open', orientation: 'beam', periodMin, thickness: [[n]] });
    const [base, mine, theirs] = [{ tables: [table(60, 1), table(90, 1)] }, { tables: [table(60, 1), table(90, 1), table(30, 5)] }, { tables: [table(60, 2)] }];
    expect(by(base, mine, theirs)).toEqual({ 'tables.open beam 60': 'theirs', 'tables.open beam 90': 'theirs', 'tables.open beam 30': 'mine' });
    expect(mergeOf(base, mine, theirs, firstChoices(differencesOf(base, mine, theirs))).tables).toEqual([table(60, 2), table(30, 5)]);
  });
  it('lists of words, of nameless entries, and of entries with one name twice are one part', () => {
    expect(by({ faces: ['top'] }, { faces: ['top', 'web'] }, { faces: ['bottom'] })).toEqual({ faces: 'both' });
    expect(by({ a: [{ n: 1 }] }, { a: [{ n: 2 }] }, { a: [{ n: 1 }, { n: 3 }] })).toEqual({ a: 'both' });
    const twice = { fits: [{ shape: 'open', orientation: 'beam', a: 1 }, { shape: 'open', orientation: 'beam', a: 2 }] };
    expect(by({ fits: [] }, twice, { fits: [] })).toEqual({ fits: 'mine' });
  });
});

describe('merging', () => {
  // every combination of three values in two fields: 27 × 27 triples of records
  const values = ['a', 'b', null];
  const triples = values.flatMap((base) => values.flatMap((mine) => values.map((theirs) => [base, mine, theirs] as const)));
  it('gives mine where all of mine is chosen, theirs where all of theirs is, and keeps every lone change by itself', () => {
    for (const x of triples) {
      for (const y of triples) {
        const [base, mine, theirs] = [0, 1, 2].map((i) => ({ x: x[i], deep: { y: y[i] } })) as [object, object, object];
        expect(sameValue(mergeOf(base, mine, theirs, all(base, mine, theirs, 'mine')), mine)).toBe(true);
        expect(sameValue(mergeOf(base, mine, theirs, all(base, mine, theirs, 'theirs')), theirs)).toBe(true);
        const differences = differencesOf(base, mine, theirs);
        const first = firstChoices(differences);
        const merged = mergeOf(base, mine, theirs, first) as { x: unknown };
        expect(undecided(differences, first).every((d) => d.by === 'both')).toBe(true);
        if (sameValue(x[0], x[2])) expect(sameValue(merged.x, x[1])).toBe(true);
        else if (sameValue(x[0], x[1])) expect(sameValue(merged.x, x[2])).toBe(true);
      }
    }
  });
  it('leaves what it was given as it was', () => {
    const [base, mine, theirs] = [structuredClone(zone), { ...zone, periodMin: 90 }, { ...zone, code: 'Z2' }];
    const before = structuredClone({ base, mine, theirs });
    expect(mergeOf(base, mine, theirs, firstChoices(differencesOf(base, mine, theirs)))).toEqual({ ...zone, code: 'Z2', periodMin: 90 });
    expect({ base, mine, theirs }).toEqual(before);
  });
});
