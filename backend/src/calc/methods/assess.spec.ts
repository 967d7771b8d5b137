import { defaultDesignBasis, memberDesignSchema, sentence } from '@mantlet/common';
import type { CriticalTemperatureBasis, FireCurve, SectionShape, ThicknessTable } from '@mantlet/common';
import fc from 'fast-check';
import { sectionProperties } from '../sections/index.js';
import type { MemberCase } from '../types.js';
import { assessMember, orientationOf } from './assess.js';
import { assessMembers } from './assess-members.js';
import { explainMember } from './explain-member.js';
import { unprotectedTemperature } from './heating.js';

// IPE 300: EN 10365 dimensions; published section factors 216 (profile, four sides), 188 (three), 139 (box, three)
const ipe300: SectionShape = { kind: 'i', hMm: 300, bMm: 150, twMm: 7.1, tfMm: 10.7, rootRadiusMm: 15 };
const table: ThicknessTable = {
  shape: 'open', orientation: 'beam', periodMin: 60, temperaturesC: [500, 550, 600], sectionFactorsPerM: [100, 200, 300],
  thickness: [[500, 450, 400], [900, 800, 700], [1500, 1300, 1100]],
};
const coating: NonNullable<MemberCase['product']> = {
  id: 'p', kind: 'coating', evidence: { form: 'table', tables: [table] }, curves: ['standard'], expired: false, name: 'Invented coating',
};
const declared: CriticalTemperatureBasis = { way: 'declared', temperatureC: 580, reference: 'Calculation 12' };
const beam: MemberCase = {
  memberType: 'beam', shape: ipe300, properties: sectionProperties(ipe300), steel: { grade: 'S355', yieldStrengthMPa: 355 },
  exposure: { arrangement: 'three-sides', reason: '' }, protectionForm: 'profile', basis: declared, accepted: false, design: defaultDesignBasis,
  readingRules: { sectionFactor: 'linear', temperature: 'next-below' }, periodMin: 60, curve: { kind: 'standard' }, product: coating,
};
const says = (c: MemberCase): string => {
  const { reason } = assessMember(c);
  return reason ? sentence(reason) : '';
};
const loaded = (momentYKnm: number): CriticalTemperatureBasis => ({
  way: 'calculated', reference: 'Calculation 12',
  design: memberDesignSchema.parse({ actions: { given: 'fire-effect', effect: { momentYKnm } }, lateralRestraint: 'continuous' }),
});

describe('one member', () => {
  it('goes from section to thickness: A/V 188, 580 °C, read between rows', () => {
    const r = assessMember(beam);
    expect(r.verdict).toBe('protected');
    expect(Math.round(r.sectionFactorPerM ?? 0)).toBe(188);
    // column 550 °C, linear in A/V: 450 + (A/V − 100)/100·350, up to the next µm
    expect(r.requiredThickness).toBe(Math.ceil(450 + ((r.sectionFactorPerM ?? 0) - 100) * 3.5));
    expect(r).toMatchObject({ criticalTemperatureC: 580, way: 'declared', thicknessUnit: 'µm', productId: 'p', reason: null, appliedThickness: null, assumed: false });
    expect(r.evidenceReading).toBe('R 60, 550 °C, A/V 100 to 200, open section, beam');
  });

  it('judges bare steel by its profile with the shadow effect, whatever the protection encloses', () => {
    const open = assessMember(beam);
    const boxed = assessMember({ ...beam, protectionForm: 'boxed', product: { ...coating, kind: 'board' } });
    expect(Math.round(boxed.sectionFactorPerM ?? 0)).toBe(139);
    expect(boxed.bareTemperatureC).toBe(open.bareTemperatureC);
    const withoutShadow = assessMember({ ...beam, design: { ...defaultDesignBasis, shadowEffect: false } });
    expect(withoutShadow.bareMinutes ?? 0).toBeLessThan(open.bareMinutes ?? 0);
    // k_sh = 1: between the published 565 °C of A/V 100 and 682 °C of A/V 200 at 15 min (computed twice over)
    expect(withoutShadow.bareMinutes).toBeGreaterThan(10);
    expect(withoutShadow.bareMinutes).toBeLessThan(15);
  });

  it('may stay bare where bare steel holds the period', () => {
    const r = assessMember({ ...beam, periodMin: 15, basis: { ...declared, temperatureC: 720 } });
    expect(r).toMatchObject({ verdict: 'bare', requiredThickness: null, reason: null });
    expect(r.bareTemperatureC).toBeLessThanOrEqual(720);
    expect(r.bareMinutes).toBeGreaterThan(15);
  });

  it('agrees with the integration of the member alone within 0.5 K', () => {
    const r = assessMember({ ...beam, exposure: { arrangement: 'four-sides', reason: '' }, design: { ...defaultDesignBasis, shadowEffect: false } });
    const alone = unprotectedTemperature({ sectionFactorPerM: r.sectionFactorPerM ?? 0, shadowFactor: 1, curve: beam.curve, emissivity: 0.7, minutes: 60, stepS: 1 });
    expect(Math.abs((r.bareTemperatureC ?? 0) - alone)).toBeLessThan(0.5);
  });

  it('decides bare or protected by the integration itself where the two are near', () => {
    const heat = { ...beam, periodMin: 30, design: { ...defaultDesignBasis, shadowEffect: false } };
    const alone = unprotectedTemperature({ sectionFactorPerM: assessMember(heat).sectionFactorPerM ?? 0, shadowFactor: 1, curve: heat.curve, emissivity: 0.7, minutes: 30 });
    expect(assessMember({ ...heat, basis: { ...declared, temperatureC: alone + 1e-6 } }).verdict).toBe('bare');
    expect(assessMember({ ...heat, basis: { ...declared, temperatureC: alone - 1e-6 } }).verdict).not.toBe('bare');
  });

  it.each<[string, Partial<MemberCase>, string, RegExp]>([
    ['no system', { product: null }, 'not-determined', /no system set for beam members/],
    ['no basis', { basis: { way: 'none' } }, 'not-determined', /Not determined/],
    ['a temperature below the evidence', { basis: { ...declared, temperatureC: 450 } }, 'outside', /450 °C is below 500 °C/],
    ['a longer period than assessed', { periodMin: 120 }, 'outside', /R 120 is above R 60/],
    ['another curve', { curve: { kind: 'hydrocarbon' } }, 'outside', /not Hydrocarbon fire/],
    ['a board that would follow the profile', { product: { ...coating, kind: 'board' } }, 'not-determined', /protection form "boxed"/],
    ['a coating that would enclose', { protectionForm: 'boxed' }, 'not-determined', /protection form "profile"/],
    ['too much load', { basis: loaded(400) }, 'under-strength', /Under-strength cold/],
  ])('with %s has no thickness, and says why', (_, change, verdict, sentenceSaid) => {
    const r = assessMember({ ...beam, ...change });
    expect(r.verdict).toBe(verdict);
    expect(r.requiredThickness).toBeNull();
    expect(says({ ...beam, ...change })).toMatch(sentenceSaid);
  });

  it('keeps the verdict of an expired assessment: expiry stops the schedule, not the arithmetic', () => {
    expect(assessMember({ ...beam, product: { ...coating, expired: true } })).toEqual(assessMember(beam));
  });

  it('judges a natural fire on the peak, cooling included', () => {
    const natural: FireCurve = { kind: 'parametric', openingFactor: 0.04, thermalAbsorptivity: 1000, fireLoadTotalMjPerM2: 100, limitTimeMin: 20 };
    const short = assessMember({ ...beam, curve: natural, periodMin: 15 });
    const long = assessMember({ ...beam, curve: natural, periodMin: 120 });
    expect(short.bareTemperatureC).toBe(long.bareTemperatureC);
    expect(short.verdict).toBe('outside');
    const small = assessMember({ ...beam, curve: { ...natural, fireLoadTotalMjPerM2: 50, openingFactor: 0.02 }, basis: { ...declared, temperatureC: 1000 } });
    expect(small.verdict).toBe('bare');
  });

  it('reads bracing and hangers with the column data', () => {
    expect(['beam', 'secondary-beam', 'column', 'bracing', 'tie'].map((t) => orientationOf(t as MemberCase['memberType']))).toEqual(['beam', 'beam', 'column', 'column', 'column']);
  });

  it('needs no less for more load', () => {
    fc.assert(fc.property(fc.double({ min: 20, max: 150, noNaN: true }), fc.double({ min: 0, max: 30, noNaN: true }), (moment, more) => {
      const [light, heavy] = [assessMember({ ...beam, basis: loaded(moment) }), assessMember({ ...beam, basis: loaded(moment + more) })];
      expect(heavy.criticalTemperatureC ?? 0).toBeLessThanOrEqual(light.criticalTemperatureC ?? 0);
      if (light.verdict === 'protected' && heavy.verdict === 'protected') expect(heavy.requiredThickness).toBeGreaterThanOrEqual(light.requiredThickness ?? 0);
    }), { numRuns: 60 });
  });
});

describe('a member explained', () => {
  it('has the result of the assessment, its working and its curves', () => {
    const c = { ...beam, basis: loaded(90) };
    const { result, working, charts } = explainMember(c);
    expect(result).toEqual(assessMember(c));
    expect(working[0]).toMatchObject({ what: 'Section factor', value: result.sectionFactorPerM, source: 'EN 1993-1-2:2005 Tables 4.2 and 4.3' });
    expect(working.some((s) => s.source.includes('4.2.5.1 (4.25)') && s.value === result.bareTemperatureC)).toBe(true);
    expect(working[working.length - 1]).toMatchObject({ value: result.requiredThickness, unit: 'µm', note: result.evidenceReading });
    for (const step of working) expect(step.value === null || Number.isFinite(step.value)).toBe(true);
    expect(charts?.resistance[0]).toMatchObject({ limitState: 'bending', unit: 'kNm', effect: 90 });
    expect(charts?.fire[60]?.[1]).toBeCloseTo(945.3, 1); // EN 1991-1-2 3.2.1 at 60 min
    expect(charts?.bare[charts.bare.length - 1]?.[0]).toBe(75);
    expect(charts?.protected).toBeNull();
  });

  it('draws protected steel where the evidence holds thermal properties, ending below the limit', () => {
    const product: MemberCase['product'] = {
      ...coating, kind: 'board',
      evidence: {
        form: 'thermal',
        properties: {
          conductivityWPerMK: 0.2, densityKgPerM3: 800, specificHeatJPerKgK: 1700, moisturePercent: 3, minThicknessMm: 12, maxThicknessMm: 50, maxSectionFactorPerM: 300,
          minSectionFactorPerM: 30, maxTemperatureC: 700, maxPeriodMin: 120, stockThicknessesMm: [12, 15, 20, 25], maxLayers: 2, thicknessStepMm: 1,
        },
      },
    };
    const { result, charts, working } = explainMember({ ...beam, protectionForm: 'boxed', product });
    expect(result.verdict).toBe('protected');
    const atPeriod = charts?.protected?.find(([minute]) => minute === 60)?.[1] ?? Infinity;
    expect(atPeriod).toBeLessThanOrEqual(580);
    expect(working.find((s) => s.what.startsWith('Protected steel'))?.value).toBeCloseTo(atPeriod, 6);
  });

  it('solves a regression in the unit of its kind, and says limits downwards', () => {
    // by hand: (60 + 15 − 0.03·580.9)/(0.9 + 0.95·580.9/A/V) at the beam's A/V
    const fit = {
      shape: 'open' as const, orientation: 'beam' as const, coefficients: [-15, 0.9, 0, 0.03, 0, 0.95, 0, 0], minThickness: 10, maxThickness: 60,
      minSectionFactorPerM: 40, maxSectionFactorPerM: 300, minTemperatureC: 350, maxTemperatureC: 750, minPeriodMin: 30, maxPeriodMin: 180,
    };
    const product: MemberCase['product'] = { ...coating, kind: 'spray', evidence: { form: 'regression', fits: [fit] } };
    const { result, working } = explainMember({ ...beam, basis: { way: 'declared', temperatureC: 580.9, reference: 'test' }, product });
    const step = working.find((s) => s.source.startsWith('EN 13381-8 annex'));
    const sectionFactorPerM = result.sectionFactorPerM as number;
    expect(step).toMatchObject({ unit: 'mm', note: expect.stringMatching(/^tested from 10 to 60 mm/) as string });
    expect(step?.value).toBeCloseTo((75 - 0.03 * 580.9) / (0.9 + (0.95 * 580.9) / sectionFactorPerM), 9);
    expect(step?.what).not.toMatch(/_/);
    expect(result.evidenceReading).toMatch(/^Regression: R 60, 580 °C/);
    expect(working.find((s) => s.what.startsWith('Bare steel'))?.note).toMatch(/^above 580 °C/);
  });

  it('ends in the reason where there is no thickness', () => {
    const { working, charts } = explainMember({ ...beam, product: null });
    expect(working[working.length - 1]).toMatchObject({ value: null, note: expect.stringMatching(/no system/) as string });
    expect(charts?.bare.length).toBeGreaterThan(60);
  });
});

describe('many members', () => {
  it('come out as one by one, in order, each with a result of its own', () => {
    const cases = [beam, { ...beam, periodMin: 30 }, beam, { ...beam, product: null }];
    const results = assessMembers(cases);
    expect(results).toEqual(cases.map((c) => assessMember(c)));
    expect(results[0]).not.toBe(results[2]);
  });
});
