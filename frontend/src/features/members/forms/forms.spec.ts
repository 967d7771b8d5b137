import { describe, expect, it } from 'vitest';
import { customSectionSchema, memberDesignSchema } from '@mantlet/common';
import type { CriticalTemperatureBasis } from '@mantlet/common';
import { acceptable } from './acceptance.js';
import { bulkFormSchema, emptyBulk } from './bulk-form.js';
import { completeShape, dimensionsOf, sectionKindNames, shapeOfKind } from './custom-section.js';
import { structuralFormSchema, structuralValues } from './structural-form.js';

const design = memberDesignSchema.parse({
  actions: { given: 'characteristic', permanent: { axialKn: 0, momentYKnm: 211, shearZKn: 0 }, leading: { axialKn: 0, momentYKnm: 170, shearZKn: 0, category: 'C' }, accompanying: [] },
  bucklingRule: 'given', lateralRestraint: 'continuous', continuousBeam: true,
});
const described = memberDesignSchema.parse({
  actions: {
    given: 'loads', supports: 'cantilever', spanMm: 2500, axialInFireKn: 12, lateralSupportsMm: [1250, 2500],
    loads: [{ kind: 'distributed', action: 'permanent', fromMm: 0, toMm: 2500, startKnPerM: 4, endKnPerM: 6 }, { kind: 'point', action: 'B', atMm: 2500, forceKn: 9 }],
  },
  lateralRestraint: 'at-points', loadHeight: 'shear-centre',
});
const ways: CriticalTemperatureBasis[] = [
  { way: 'declared', temperatureC: 560, reference: 'Letter' }, { way: 'utilisation', mu0: 0.55, mayBuckle: true, reference: 'Sheet 1' },
  { way: 'ambient-utilisation', utilisation: 0.8, etaFi: null, mayBuckle: false, reference: 'Sheet 2' }, { way: 'calculated', design, reference: 'Sheet 3' }, { way: 'calculated', design: described, reference: 'Sheet 4' }, { way: 'assumed' }, { way: 'none' },
];

describe('the structural form', () => {
  it.each(ways.map((w) => [w.way, 'reference' in w ? w.reference : '', w] as const))('%s (%s) comes back from the form as it is stored', (_, __, basis) => {
    expect(structuralFormSchema.parse(structuralValues(basis))).toEqual({ basis });
  });
  it('sends nothing of the ways not chosen, but keeps them in the form', () => {
    const values = structuralValues({ way: 'declared', temperatureC: 560, reference: 'Letter' });
    expect(structuralFormSchema.parse({ ...values, basis: { ...values.basis, way: 'assumed' } })).toEqual({ basis: { way: 'assumed' } });
  });
  it('asks for a value and its reference', () => {
    const result = structuralFormSchema.safeParse(structuralValues({ way: 'declared' } as never));
    expect(result.success).toBe(false);
    expect(result.error?.issues.map((i) => i.path.join('.'))).toEqual(['basis.temperatureC', 'basis.reference']);
  });
});

describe('the bulk form', () => {
  it('sends only what was chosen', () => {
    expect(bulkFormSchema.parse({ ...emptyBulk, grade: 'S355', onSite: 'shop' })).toEqual({ grade: 'S355', onSite: false });
  });
  it('refuses to set nothing, and faces without a face', () => {
    expect(bulkFormSchema.safeParse(emptyBulk).error?.issues[0]?.message).toBe('Choose at least one field to set.');
    expect(bulkFormSchema.safeParse({ ...emptyBulk, exposure: { arrangement: 'given-faces', reason: '' } }).success).toBe(false);
  });
});

describe('sections from dimensions', () => {
  const kinds = Object.keys(sectionKindNames) as (keyof typeof sectionKindNames)[];
  it.each(kinds)('%s: the form asks for exactly what the contract needs', (kind) => {
    const shape = { ...shapeOfKind(kind, {}), ...Object.fromEntries(dimensionsOf[kind].map(({ name }) => [name, name === 'flangeSlope' ? 0.08 : 20])) };
    expect(customSectionSchema.parse({ designation: 'X', shape }).shape).toEqual(shape);
    for (const { name } of dimensionsOf[kind]) expect(customSectionSchema.safeParse({ designation: 'X', shape: { ...shape, [name]: null } }).success, name).toBe(false);
  });
  it('keeps shared dimensions when the kind changes, and draws only what is complete', () => {
    const box = shapeOfKind('box', { hMm: 400, bMm: 300, twMm: 10, tfMm: 20 });
    expect(box).toMatchObject({ kind: 'box', hMm: 400, clearWidthMm: null });
    expect(completeShape(box)).toBeNull();
    expect(completeShape({ ...box, clearWidthMm: 250 })).not.toBeNull();
  });
});

it('offers an acceptance only where it applies', () => {
  const one = { id: 'a', mark: 'A', assumed: true, criticalTemperatureC: 550, verdict: 'protected' as const };
  const by = acceptable([one, { ...one, id: 'b', assumed: false, criticalTemperatureC: 700 }, { ...one, id: 'c', assumed: false, criticalTemperatureC: 650, verdict: 'bare' }], 650);
  expect([by.assumed, by['high-temperature'], by.bare].map((list) => list.map((m) => m.id))).toEqual([['a'], ['b'], ['c']]);
});
