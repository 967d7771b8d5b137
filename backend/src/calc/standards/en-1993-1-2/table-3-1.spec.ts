import fc from 'fast-check';
import { kE, kY, temperatureOfKe, temperatureOfKy } from './table-3-1.js';

const theta = fc.double({ min: 20, max: 1300, noNaN: true });

describe('Table 3.1 read both ways', () => {
  it('inverts exactly, to the highest temperature that still has the factor', () => {
    fc.assert(fc.property(fc.double({ min: 1e-4, max: 1, noNaN: true }), (factor) => {
      for (const [read, inverse] of [[kY, temperatureOfKy], [kE, temperatureOfKe]] as const) {
        const found = inverse(factor);
        expect(read(found)).toBeCloseTo(factor, 12);
        expect(read(found + 1e-6)).toBeLessThan(factor);
      }
    }));
    expect(temperatureOfKy(1)).toBe(400);
    expect(temperatureOfKe(1)).toBe(100);
    expect(temperatureOfKy(0)).toBe(1200);
    expect(temperatureOfKy(1.01)).toBe(20);
  });

  it('never rises with temperature and ends at 1200 °C', () => {
    fc.assert(fc.property(theta, theta, (a, b) => {
      const [low, high] = a < b ? [a, b] : [b, a];
      expect(kY(high)).toBeLessThanOrEqual(kY(low));
      expect(kE(high)).toBeLessThanOrEqual(kE(low));
    }));
    expect([kY(1200), kE(1200), kY(1250)]).toEqual([0, 0, 0]);
  });
});
