import { assessMembers } from '../calc/index.js';
import { generatedMembers } from './generated-members.js';
import { assessPlainly } from './plain-loop.js';

describe('bulk assessment against the plain loop', () => {
  const cases = generatedMembers(800, 7);
  const fast = assessMembers(cases);
  const plain = assessPlainly(cases);

  it('measures distinct members of every kind', () => {
    expect(new Set(fast.map((r) => r.sectionFactorPerM)).size).toBe(cases.length);
    expect(new Set(fast.map((r) => r.verdict))).toEqual(new Set(['protected', 'bare', 'outside', 'under-strength']));
    for (const form of ['table', 'regression', 'thermal']) expect(cases.filter((c) => c.product?.evidence.form === form).length).toBeGreaterThan(100);
    expect(generatedMembers(3, 7)).toEqual(cases.slice(0, 3));
  });

  it('gives the same verdicts and thicknesses, and bare temperatures within the bound of the field and the step', () => {
    fast.forEach((r, i) => {
      const p = plain[i];
      expect([i, r.verdict, r.requiredThickness, r.criticalTemperatureC]).toEqual([i, p?.verdict, p?.requiredThickness, p?.criticalTemperatureC]);
      // 0.5 K of the field, and what steps of 5 s differ from 1 s by where the specific heat peaks
      if (r.bareTemperatureC !== null) expect(Math.abs(r.bareTemperatureC - (p?.bareTemperatureC ?? 0))).toBeLessThan(1.5);
      if (r.bareMinutes !== null) expect(Math.abs(r.bareMinutes - (p?.bareMinutes ?? 0))).toBeLessThan(0.1);
    });
  });
});
