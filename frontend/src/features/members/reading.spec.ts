import { describe, expect, it } from 'vitest';
import type { MemberSheetDto } from '@mantlet/common';
import { heatingCaption, loadCaption, loadSide, readingData } from './reading.js';

// invented figures, of the course that curves of this kind take
const bending = { limitState: 'bending', unit: 'kNm' as const, effect: 330, points: [[20, 522], [400, 522], [600, 300], [1200, 0]] as [number, number][] };
const shear = { limitState: 'shear', unit: 'kN' as const, effect: 100, points: [[20, 400], [400, 400], [700, 80], [1200, 0]] as [number, number][] };
const none = { limitState: 'compression', unit: 'kN' as const, effect: 0, points: [[20, 900], [1200, 0]] as [number, number][] };
const charts = { resistance: [shear, bending, none], utilisation: null, fire: [[0, 20], [60, 945]] as [number, number][], bare: [[0, 20], [60, 900]] as [number, number][], protected: null, periodMin: 60 };
const sheet = (result: object, more: object = {}) => ({
  charts, zone: { periodMin: 60, curve: 'standard' }, member: { basis: { way: 'calculated', reference: 'Sheet 3' }, basisSetBy: null, basisSetAt: null },
  result: { verdict: 'protected', criticalTemperatureC: 572.9, bareCriticalTemperatureC: 590, bareMinutes: 38.9, governing: 'bending', utilisation: 0.63, assumed: false, requiredThickness: 620, thicknessUnit: 'µm', ...result }, ...more,
}) as unknown as MemberSheetDto & { charts: NonNullable<MemberSheetDto['charts']> };

describe('what the drawing of a member is read from', () => {
  it('shows the limit state that governs, and another or all on request', () => {
    expect(loadSide(sheet({}), null)).toMatchObject({ effect: 330, axis: 'bending moment, kNm' });
    expect(loadSide(sheet({}), 'shear')).toMatchObject({ effect: 100, axis: 'shear force, kN' });
    const all = loadSide(sheet({}), 'all');
    expect(all?.curves.map((c) => c.name)).toEqual(['bending resistance', 'shear resistance']);
    expect(all?.curves[1]?.points[0]).toEqual([20, 4]);
  });
  it('is read along the crossing of the limit state that is looked at, without calling that the critical temperature', () => {
    expect(readingData(sheet({}), null)).toMatchObject({ criticalC: 572.9, criticalText: 'θ_cr 572 °C' });
    const other = readingData(sheet({}), 'shear');
    expect(other.criticalC).toBeCloseTo(400 + (300 * 300) / 320);
    expect(other.criticalText).toBe('681 °C');
  });
  it('draws the relation a utilisation was read from, and nothing at all for a declared temperature', () => {
    const utilisation = { value: 0.41, points: [[349, 1], [554, 0.6], [616, 0.41], [1100, 0.013]] as [number, number][] };
    expect(loadSide(sheet({}, { charts: { ...charts, resistance: [], utilisation } }), null)).toMatchObject({ effect: 0.41, axis: 'utilisation in fire' });
    const declared = sheet({ governing: null, utilisation: null }, { charts: { ...charts, resistance: [] } });
    expect(loadSide(declared, null)).toBeNull();
    expect(loadCaption(declared)).toMatchObject({ title: 'Critical temperature 572 °C', sub: expect.stringContaining('No load was compared with a resistance') as string });
  });
  it('gives bare steel its own limit where κ1 differs, and says so', () => {
    expect(readingData(sheet({}), null).bareLimitC).toBe(590);
    expect(heatingCaption(sheet({}))).toMatchObject({ title: 'Bare, it is at 590 °C after 38 minutes', sub: expect.stringContaining('protected, 572 °C (κ1)') as string });
  });
  it('says why no protected line is drawn, and that a member fails cold', () => {
    expect(heatingCaption(sheet({})).sub).toContain('no protected line is drawn');
    expect(heatingCaption(sheet({}, { charts: { ...charts, protected: [[0, 20], [60, 600]] } })).sub).toMatch(/holds to 57 minutes/);
    expect(loadCaption(sheet({ verdict: 'under-strength', criticalTemperatureC: null })).title).toBe('Does not carry its load cold');
  });
});
