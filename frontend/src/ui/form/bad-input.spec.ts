import type { z } from 'zod';
import { describe, expect, it } from 'vitest';
import { customSectionSchema, designBasisSchema, defaultDesignBasis, levelInputSchema, memberInputSchema, membershipInputSchema, productInputSchema, productSupplySchema, projectInputSchema, revisionInputSchema, zoneInputSchema } from '@mantlet/common';
import { fieldSentence } from './field-frame.js';

const id = '11111111-1111-4111-8111-111111111111';
/** A right record for every form, from which one field at a time is spoilt. */
const forms: [string, z.ZodType, Record<string, unknown>][] = [
  ['project', projectInputSchema, { number: '24-017', name: 'House', place: 'Town', currency: 'EUR', note: 'n' }],
  ['level', levelInputSchema, { code: 'L1', name: 'First', elevationM: 4, heightM: 3 }],
  ['zone', zoneInputSchema, { levelId: id, code: 'Z1', name: 'Zone', periodMin: 60, curve: { kind: 'parametric', openingFactor: 0.04, thermalAbsorptivity: 1000, fireLoadTotalMjPerM2: 200, limitTimeMin: 20 }, reference: 'FS 4.2' }],
  ['member', memberInputSchema, { zoneId: id, mark: 'B1', memberType: 'beam', sectionId: id, grade: 'S355', lengthMm: 6000, quantity: 1, exposure: { arrangement: 'four-sides', reason: 'r' }, protectionForm: 'profile', coatBackConnections: 0, coatBackGirthMm: 0, deductionM2: 0, onSite: true, note: 'n' }],
  ['section', customSectionSchema, { designation: 'PG 800', shape: { kind: 'flat', hMm: 100, tMm: 10 } }],
  ['revision', revisionInputSchema, { code: 'P01', purpose: 'p' }],
  ['person', membershipInputSchema, { email: 'a@fire.example.test', roles: ['reader'] }],
  ['design basis', designBasisSchema, defaultDesignBasis as unknown as Record<string, unknown>],
  ['product', productInputSchema, { name: 'P', maker: 'M', kind: 'spray', invented: true, evidenceReference: 'R', evidenceEdition: '1', evidenceExpiresOn: '2030-01-31', evidenceStandard: 'EN 13381-4', curves: ['standard'], environments: [], supply: productSupplySchema.parse({}), note: 'n', evidence: { form: 'thermal', properties: { conductivityWPerMK: 0.1, densityKgPerM3: 300, specificHeatJPerKgK: 1000, moisturePercent: 1, minThicknessMm: 10, maxThicknessMm: 50, maxSectionFactorPerM: 300, minSectionFactorPerM: 40, maxTemperatureC: 750, maxPeriodMin: 240, stockThicknessesMm: [], maxLayers: 1, thicknessStepMm: 1 } } }],
];
const texts = ['<script>alert(1)</script>', `"'; DROP TABLE members; --`, '🔥🧯', 'منطقة الحريق', 'e\u0301e\u0323', 'a\u0000b', '   ', '', '1,5', '1e400', 'x'.repeat(5000)];
const bad: unknown[] = [...texts, undefined, null, true, 0, -1, Number.NaN, Infinity, -Infinity, 1e308, [], {}, ['x'], { toString: 'no' }];

const leaves = (value: unknown, path: string[] = []): string[][] =>
  typeof value === 'object' && value !== null && !Array.isArray(value) ? Object.entries(value).flatMap(([key, part]) => leaves(part, [...path, key])) : [path];
function spoil(record: unknown, [key = '', ...rest]: string[], value: unknown): unknown {
  const fields = record as Record<string, unknown>;
  return { ...fields, [key]: rest.length ? spoil(fields[key], rest, value) : value };
}
const at = (record: unknown, path: string[]): unknown => path.reduce<unknown>((part, key) => (part as Record<string, unknown> | undefined)?.[key], record);

describe.each(forms)('the form of a %s', (_, schema, right) => {
  it('takes what is right', () => { expect(schema.safeParse(right).error?.issues ?? []).toEqual([]); });
  it.each(leaves(right).map((path) => [path.join('.'), path] as const))('%s: anything at all is taken as it is or refused in a sentence', (_name, path) => {
    for (const value of bad) {
      const read = schema.safeParse(spoil(right, path, value));
      if (read.success) {
        const taken = at(read.data, path);
        // text comes back byte for byte, but for the blanks around it
        if (typeof value === 'string') expect([value.trim(), undefined]).toContain(taken);
        if (typeof taken === 'number') expect(Number.isFinite(taken)).toBe(true);
        continue;
      }
      for (const issue of read.error.issues) {
        const said = fieldSentence('Field', issue.message);
        expect(said).toMatch(/^\S.*[.!?]$/s);
        expect(said, `${JSON.stringify(value)}: ${issue.message}`).not.toMatch(/Invalid|Too (big|small)|expected|received|undefined|NaN/);
      }
    }
  });
});
