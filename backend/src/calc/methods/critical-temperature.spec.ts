import { defaultDesignBasis, memberDesignSchema, sentence } from '@mantlet/common';
import type { CriticalTemperatureBasis, SectionShape } from '@mantlet/common';
import fc from 'fast-check';
import { sectionProperties } from '../sections/index.js';
import { kY } from '../standards/index.js';
import type { CriticalTemperature, CriticalTemperatureCase } from '../types.js';
import { criticalTemperature, explainCriticalTemperature, resistanceCurve } from './critical-temperature.js';
import { utilisationCurve } from './critical-temperature-utilisation.js';

/** dimensions of EN 10365 */
const ipe300: SectionShape = { kind: 'i', hMm: 300, bMm: 150, twMm: 7.1, tfMm: 10.7, rootRadiusMm: 15 };
const he200b: SectionShape = { kind: 'i', hMm: 200, bMm: 200, twMm: 9, tfMm: 15, rootRadiusMm: 18 };
const square: SectionShape = { kind: 'rectangular-hollow', hMm: 150, bMm: 150, tMm: 8, outerRadiusMm: 12, innerRadiusMm: 8 };

type Effect = { axialKn?: number; momentYKnm?: number; shearZKn?: number };
function calculatedBasis(effect: Effect, more: object = {}): CriticalTemperatureBasis {
  const design = memberDesignSchema.parse({ actions: { given: 'fire-effect', effect }, lateralRestraint: 'continuous', ...more });
  return { way: 'calculated', design, reference: 'test' };
}
function member(basis: CriticalTemperatureBasis, change: Partial<CriticalTemperatureCase> = {}): CriticalTemperatureCase {
  const shape = change.shape ?? ipe300;
  return {
    basis, memberType: 'beam', shape, properties: sectionProperties(shape), steel: { grade: 'S275', yieldStrengthMPa: 275 },
    exposure: { arrangement: 'four-sides', reason: '' }, design: defaultDesignBasis, accepted: false, ...change,
  };
}
const column = (axialKn: number, lengthMm: number, change: Partial<CriticalTemperatureCase> = {}) =>
  member(calculatedBasis({ axialKn }, { bucklingLengthYMm: lengthMm, bucklingLengthZMm: lengthMm }), { memberType: 'column', shape: he200b, ...change });
function determined(result: CriticalTemperature): Extract<CriticalTemperature, { kind: 'determined' }> {
  if (result.kind !== 'determined') throw new Error(sentence(result.reason));
  return result;
}
function reason(result: CriticalTemperature): string {
  if (result.kind === 'determined') throw new Error(`determined: ${result.temperatureC}`);
  return sentence(result.reason);
}

describe('bending', () => {
  it('inverts k_y exactly: half the cold resistance is 590.3 °C (EN 1993-1-2 Table 3.1)', () => {
    const moment = (0.5 * sectionProperties(ipe300).wplYMm3 * 275) / 1e6;
    const result = determined(criticalTemperature(member(calculatedBasis({ momentYKnm: moment }))));
    expect(result.temperatureC).toBeCloseTo(500 + (100 * 0.28) / 0.31, 6);
    expect(result).toMatchObject({ governing: 'bending', method: 'limit states of EN 1993-1-2', assumed: false, way: 'calculated' });
    expect(result.utilisation).toBeCloseTo(0.5, 9);
  });

  it('uses κ1 under a slab, more for bare than for protected steel, and κ2 over supports', () => {
    const moment = (0.5 * sectionProperties(ipe300).wplYMm3 * 275) / 1e6;
    const slab = { exposure: { arrangement: 'three-sides' as const, reason: '' } };
    const under = determined(criticalTemperature(member(calculatedBasis({ momentYKnm: moment }), slab)));
    // k_y needed: 0.5·0.85 = 0.425 and 0.5·0.7 = 0.35
    expect(under.temperatureC).toBeCloseTo(600 + (100 * (0.47 - 0.425)) / 0.24, 6);
    expect(under.bareTemperatureC).toBeCloseTo(600 + (100 * (0.47 - 0.35)) / 0.24, 6);
    const continuous = determined(criticalTemperature(member(calculatedBasis({ momentYKnm: moment }, { continuousBeam: true }), slab)));
    expect(continuous.temperatureC).toBeCloseTo(600 + (100 * (0.47 - 0.36125)) / 0.24, 6);
  });

  it('keeps κ1 for beams: a column against a wall has none', () => {
    const moment = (0.5 * sectionProperties(ipe300).wplYMm3 * 275) / 1e6;
    const result = determined(criticalTemperature(member(calculatedBasis({ momentYKnm: moment }), { memberType: 'column', exposure: { arrangement: 'three-sides', reason: 'against a wall' } })));
    expect([result.temperatureC, result.bareTemperatureC]).toEqual([expect.closeTo(590.32, 2), expect.closeTo(590.32, 2)]);
  });

  it('never lets κ lift the resistance above the cold one', () => {
    const moment = (1.01 * sectionProperties(ipe300).wplYMm3 * 275) / 1e6;
    const result = criticalTemperature(member(calculatedBasis({ momentYKnm: moment }), { exposure: { arrangement: 'three-sides', reason: '' } }));
    expect(result).toMatchObject({ kind: 'under-strength', governing: 'bending' });
    expect(reason(result)).toContain('utilisation 1.01');
    const { working } = explainCriticalTemperature(member(calculatedBasis({ momentYKnm: moment }), { exposure: { arrangement: 'three-sides', reason: '' } }));
    const utilisation = working.find((step) => step.what === 'Degree of utilisation in bending');
    expect(utilisation).toMatchObject({ value: expect.closeTo(1.01, 10), note: 'above 1: fails before any fire' });
  });

  it('loses resistance beside high shear (EN 1993-1-1 6.2.8)', () => {
    const p = sectionProperties(ipe300);
    const momentYKnm = (0.4 * p.wplYMm3 * 275) / 1e6;
    const plastic = (p.shearAreaZMm2 * 275) / Math.sqrt(3) / 1e3;
    const t = (shearZKn: number) => determined(criticalTemperature(member(calculatedBasis({ momentYKnm, shearZKn })))).limitStates.find((s) => s.name === 'bending')!.temperatureC;
    expect(t(0.19 * plastic)).toBe(t(0.01 * plastic)); // at k_y = 0.4 the shear is below half
    expect(t(0.3 * plastic)).toBeLessThan(t(0.19 * plastic));
    // at the temperature found, the reduced section carries exactly the moment: k_y·(W_pl − ρ·A_w²/(4·t_w))·f_y = M
    const ky = kY(t(0.3 * plastic));
    const rho = ((2 * 0.3) / ky - 1) ** 2;
    const web = ((300 - 2 * 10.7) ** 2 * 7.1) / 4;
    expect((ky * (p.wplYMm3 - rho * web) * 275) / 1e6).toBeCloseTo(momentYKnm, 6);
  });
});

describe('compression', () => {
  it('has the resistance equal the effect at the critical temperature', () => {
    fc.assert(fc.property(fc.double({ min: 0.05, max: 0.95, noNaN: true }), fc.double({ min: 500, max: 9000, noNaN: true }), (share, length) => {
      const cold = determined(criticalTemperature(column(1, length))).limitStates[0]!.resistanceCold;
      const result = determined(criticalTemperature(column(share * cold, length)));
      const curve = resistanceCurve(column(share * cold, length), 0.5)[0]!;
      const index = Math.floor((result.temperatureC - 20) / 0.5);
      expect(curve.points[index]!.resistance).toBeGreaterThanOrEqual(share * cold * (1 - 1e-9));
      expect(curve.points[index + 1]!.resistance).toBeLessThan(share * cold * (1 + 1e-9));
    }), { numRuns: 40 });
  });

  it('falls with load and with length; the resistance falls with temperature', () => {
    fc.assert(fc.property(fc.double({ min: 50, max: 900, noNaN: true }), fc.double({ min: 1000, max: 6000, noNaN: true }), (load, length) => {
      const at = (l: number, n: number) => criticalTemperature(column(n, l));
      const base = at(length, load);
      const longer = at(length * 1.2, load);
      const heavier = at(length, load * 1.1);
      const value = (r: CriticalTemperature) => (r.kind === 'determined' ? r.temperatureC : 0);
      expect(value(longer)).toBeLessThanOrEqual(value(base));
      expect(value(heavier)).toBeLessThanOrEqual(value(base));
    }), { numRuns: 60 });
    for (const length of [500, 3000, 8000, 15000]) {
      const { points } = resistanceCurve(column(100, length), 5)[0]!;
      for (let i = 1; i < points.length; i += 1) expect(points[i]!.resistance).toBeLessThanOrEqual(points[i - 1]!.resistance);
      expect(points.at(-1)!.resistance).toBe(0);
    }
  });

  it('shortens the column only by the confirmed rule (4.2.3.2(5))', () => {
    const by = (bucklingRule: string) => determined(criticalTemperature(member(
      calculatedBasis({ axialKn: 600 }, { bucklingLengthYMm: 4000, bucklingLengthZMm: 4000, bucklingRule }), { memberType: 'column', shape: he200b }))).temperatureC;
    expect(by('braced-intermediate')).toBeCloseTo(determined(criticalTemperature(column(600, 2000))).temperatureC, 6);
    expect(by('braced-top')).toBeCloseTo(determined(criticalTemperature(column(600, 2800))).temperatureC, 6);
  });

  it('names the axis that governs', () => {
    const about = (y: number, z: number) => determined(criticalTemperature(member(
      calculatedBasis({ axialKn: 300 }, { bucklingLengthYMm: y, bucklingLengthZMm: z }), { memberType: 'column', shape: he200b }))).limitStates[0]!.clause;
    expect(about(4000, 4000)).toBe('EN 1993-1-2 4.2.3.2, about z');
    expect(about(8000, 2000)).toBe('EN 1993-1-2 4.2.3.2, about y');
  });
});

describe('actions', () => {
  const actions = (permanent: number, leading: number, accompanying: number) => ({
    given: 'characteristic', permanent: { axialKn: permanent }, leading: { axialKn: leading, category: 'B' }, accompanying: [{ axialKn: accompanying, category: 'wind' }, { axialKn: 10, category: 'E' }],
  });
  const solve = (a: object) => criticalTemperature(member({ way: 'calculated', reference: 'test', design: memberDesignSchema.parse({ actions: a, bucklingLengthYMm: 3000, bucklingLengthZMm: 3000, lateralRestraint: 'continuous' }) }, { shape: he200b, memberType: 'column' }));

  it('combines by EN 1990 6.4.3.3: G + ψ1·Q1 + Σψ2·Qi', () => {
    // 200 + 0.5·100 + 0·50 + 0.8·10 = 258
    expect(determined(solve(actions(200, 100, 50))).limitStates[0]!.effect).toBeCloseTo(258, 9);
  });

  it('checks compression and tension where a variable action can turn the sign', () => {
    const states = determined(solve(actions(20, -200, 0))).limitStates.map((s) => [s.name, Math.round(s.effect)]);
    expect(states).toEqual([['tension', 80], ['compression', 28]]);
  });
});

describe('refusals', () => {
  it.each<[string, CriticalTemperatureCase]>([
    ['Not determined: no actions given.', member(calculatedBasis({}))],
    ['Not determined: no buckling length about z.', member(calculatedBasis({ axialKn: 100 }, { bucklingLengthYMm: 3000 }))],
    ['Not determined: no buckling length about y.', member(calculatedBasis({ axialKn: 100 }))],
    ['distance between the points that hold the compression flange', member(calculatedBasis({ momentYKnm: 10 }, { lateralRestraint: 'at-points' }))],
    ['lateral-torsional', member(calculatedBasis({ momentYKnm: 10 }, { lateralRestraint: 'at-points', lateralSpacingMm: 3000 }), { shape: { kind: 'box', hMm: 400, bMm: 200, twMm: 10, tfMm: 15, clearWidthMm: 150 }, properties: { ...sectionProperties(ipe300), itMm4: null } })],
    ['no buckling length about y', member(calculatedBasis({ momentYKnm: 10, axialKn: 1 }))],
    ['composite', member(calculatedBasis({ momentYKnm: 10 }, { composite: true }))],
    ['web openings', member(calculatedBasis({ momentYKnm: 10 }, { webOpenings: true }))],
    ['a channel', member(calculatedBasis({ momentYKnm: 10 }), { shape: { kind: 'channel', hMm: 200, bMm: 75, twMm: 8.5, tfMm: 11.5, rootRadiusMm: 11.5, toeRadiusMm: 6, flangeSlope: 0.08 } })],
    ['buckle in shear', member(calculatedBasis({ momentYKnm: 10, shearZKn: 10 }), { shape: { kind: 'i', hMm: 1000, bMm: 300, twMm: 8, tfMm: 20, rootRadiusMm: 0 } })],
    ['this member is not a column', member(calculatedBasis({ axialKn: 10 }, { bucklingLengthYMm: 3000, bucklingLengthZMm: 3000, bucklingRule: 'braced-intermediate' }), { memberType: 'bracing' })],
    ['Not determined: no critical temperature', member({ way: 'none' })],
  ])('%s', (words, c) => {
    expect(criticalTemperature(c).kind).toBe('not-determined');
    expect(reason(criticalTemperature(c))).toContain(words);
    expect(resistanceCurve(c)).toEqual([]);
  });

  it('lets a square hollow section be held at points: it does not buckle sideways', () => {
    expect(criticalTemperature(member(calculatedBasis({ momentYKnm: 10 }, { lateralRestraint: 'at-points' }), { shape: square })).kind).toBe('determined');
  });
});

describe('class', () => {
  const slender: SectionShape = { kind: 'rectangular-hollow', hMm: 300, bMm: 300, tMm: 6.3, outerRadiusMm: 9.45, innerRadiusMm: 6.3 };
  it('gives class 4 the setting of the project, in every way but declared, and not in tension', () => {
    const as = (basis: CriticalTemperatureBasis, memberType: CriticalTemperatureCase['memberType'] = 'column') => determined(criticalTemperature(member(basis, { shape: slender, memberType })));
    expect(as(calculatedBasis({ axialKn: 100 }, { bucklingLengthYMm: 3000, bucklingLengthZMm: 3000, lateralRestraint: 'continuous' }))).toMatchObject({ temperatureC: 350, method: 'class 4 default', limitStates: [] });
    expect(as({ way: 'utilisation', mu0: 0.3, reference: 'test' })).toMatchObject({ temperatureC: 350, method: 'class 4 default' });
    expect(as({ way: 'assumed' })).toMatchObject({ temperatureC: 350, method: 'class 4 default', assumed: true });
    expect(as({ way: 'declared', temperatureC: 500, reference: 'test' })).toMatchObject({ temperatureC: 500, method: 'declared' });
    expect(as(calculatedBasis({ axialKn: -100 })).limitStates[0]!.name).toBe('tension');
    expect(as({ way: 'utilisation', mu0: 0.3, reference: 'test' }, 'tie').method).toBe('equation (4.22)');
  });

  it('reports a class 4 member that even its gross section cannot carry', () => {
    const c = member(calculatedBasis({ axialKn: 5000 }, { bucklingLengthYMm: 3000, bucklingLengthZMm: 3000, lateralRestraint: 'continuous' }), { shape: slender, memberType: 'column' });
    expect(criticalTemperature(c).kind).toBe('under-strength');
  });

  it('uses the elastic modulus in class 3', () => {
    // flange c/t = 95/12 = 7.9, between 10·ε = 6.9 and 14·ε = 9.7 with ε = 0.85·√(235/355)
    const wide: SectionShape = { kind: 'i', hMm: 300, bMm: 220, twMm: 10, tfMm: 12, rootRadiusMm: 10 };
    const steel = { grade: 'S355', yieldStrengthMPa: 355 };
    const state = determined(criticalTemperature(member(calculatedBasis({ momentYKnm: 20 }), { shape: wide, steel }))).limitStates[0]!;
    expect(state.clause).toBe('EN 1993-1-2 4.2.3.4');
    expect(state.resistanceCold).toBeCloseTo((sectionProperties(wide).welYMm3 * 355) / 1e6, 9);
  });
});

describe('utilisation', () => {
  const at = (mu0: number, change: Partial<CriticalTemperatureCase> = {}) => determined(criticalTemperature(member({ way: 'utilisation', mu0, reference: 'test' }, change)));
  it('reads equation (4.22), μ0 below 0.013 as 0.013', () => {
    expect(Math.round(at(0.6).temperatureC)).toBe(554);
    expect(at(0.005).temperatureC).toBe(at(0.013).temperatureC);
    expect(at(0.6).method).toBe('equation (4.22)');
  });
  it('or inverts k_y where the project says so', () => {
    const result = at(0.5, { design: { ...defaultDesignBasis, utilisationMethod: 'inversion-of-ky' } });
    expect(result.temperatureC).toBeCloseTo(590.32, 2);
    expect(result.method).toBe('inversion of k_y');
  });
  it('stays below the full calculation where buckling may govern, for every slenderness', () => {
    fc.assert(fc.property(fc.double({ min: 0.05, max: 0.99, noNaN: true }), fc.double({ min: 300, max: 12000, noNaN: true }), (mu0, length) => {
      const cold = determined(criticalTemperature(column(1, length))).limitStates[0]!.resistanceCold;
      const full = determined(criticalTemperature(column(mu0 * cold, length))).temperatureC;
      expect(at(mu0, { memberType: 'column', shape: he200b }).temperatureC).toBeLessThanOrEqual(full + 1e-6);
    }), { numRuns: 80 });
  });
  it('multiplies the cold utilisation by η_fi, the project’s or its own', () => {
    const from = (etaFi: number | null) => determined(criticalTemperature(member({ way: 'ambient-utilisation', utilisation: 0.8, etaFi, reference: 'test' }))).temperatureC;
    expect(from(null)).toBeCloseTo(at(0.8 * 0.65).temperatureC, 9);
    expect(from(0.5)).toBeCloseTo(at(0.4).temperatureC, 9);
  });
  it.each<[string, Partial<CriticalTemperatureCase>]>([
    ['equation (4.22)', {}], ['k_y', { design: { ...defaultDesignBasis, utilisationMethod: 'inversion-of-ky' } }], ['the smaller of k_y and k_E', { memberType: 'column', shape: he200b }],
  ])('draws the relation it reads from: %s', (_, change) => {
    for (const mu0 of [0.1, 0.42, 0.6, 0.85]) {
      const { method, temperatureC } = at(mu0, change);
      const points = utilisationCurve(method) ?? [];
      const i = points.findIndex(([, share]) => share <= mu0);
      const [[fromC, from], [toC, to]] = [points[i - 1]!, points[i]!];
      // the drawing joins its points by straight lines
      expect(Math.abs(fromC + ((toC - fromC) * (from - mu0)) / (from - to) - temperatureC)).toBeLessThan(1.5);
    }
  });
  it('draws no relation for a temperature that came about otherwise', () => expect(utilisationCurve('class 4 default')).toBeNull());
  it('above 1 is under-strength cold', () => {
    for (const basis of [{ way: 'utilisation', mu0: 1.2, reference: 'x' }, { way: 'ambient-utilisation', utilisation: 1.2, etaFi: null, reference: 'x' }] as const) {
      const result = criticalTemperature(member(basis));
      expect(result).toMatchObject({ kind: 'under-strength', utilisation: 1.2 });
      expect(reason(result)).toBe('Under-strength cold: the utilisation given, 1.20, is above 1.');
    }
  });
});

describe('assumed', () => {
  it('is the default of the type, assumed until accepted', () => {
    expect(criticalTemperature(member({ way: 'assumed' }))).toMatchObject({ temperatureC: 620, assumed: true, method: 'assumed by member type' });
    expect(criticalTemperature(member({ way: 'assumed' }, { memberType: 'column', shape: he200b, accepted: true }))).toMatchObject({ temperatureC: 550, assumed: false });
  });
});

describe('working', () => {
  it('comes from the same path as the result', () => {
    fc.assert(fc.property(fc.double({ min: 10, max: 700, noNaN: true }), (load) => {
      const c = column(load, 3500);
      const { result, working } = explainCriticalTemperature(c);
      expect(result).toEqual(criticalTemperature(c));
      expect(working.at(-1)!.value).toBe(determined(result).limitStates[0]!.temperatureC);
      // the resistance printed at the critical temperature is the effect
      expect(working.at(-2)!.value! / 1e3).toBeCloseTo(load, 4);
      for (const step of working) expect(step.source.length).toBeGreaterThan(5);
    }), { numRuns: 20 });
  });
});
