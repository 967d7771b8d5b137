import fc from 'fast-check';
import { beamDiagram, greatestMoment, greatestShear } from './beam-diagram.js';
import type { Beam, BeamLoad, BeamSupports } from './beam-types.js';

const L = 8000;
const w = 20;
const P = 100e3;
const uniform: BeamLoad = { kind: 'distributed', fromMm: 0, toMm: L, startNPerMm: w, endNPerMm: w };
const rising: BeamLoad = { kind: 'distributed', fromMm: 0, toMm: L, startNPerMm: 0, endNPerMm: w };
const middle: BeamLoad = { kind: 'point', atMm: L / 2, forceN: P };
const of = (supports: BeamSupports, ...loads: BeamLoad[]) => beamDiagram({ supports, spanMm: L, loads });

// the usual beam formulas of structural handbooks (common practice)
describe('moment and shear of one span', () => {
  it.each<[string, BeamSupports, BeamLoad, number, number]>([
    ['wL²/8 at mid-span', 'simple', uniform, L / 2, (w * L * L) / 8],
    ['PL/4 under the force', 'simple', middle, L / 2, (P * L) / 4],
    ['wL²/(9√3) under a triangular load, at L/√3', 'simple', rising, L / Math.sqrt(3), (w * L * L) / (9 * Math.sqrt(3))],
    ['−wL²/12 at a built-in end', 'fixed', uniform, 0, -(w * L * L) / 12],
    ['wL²/24 between built-in ends', 'fixed', uniform, L / 2, (w * L * L) / 24],
    ['−PL/8 at a built-in end', 'fixed', middle, L, -(P * L) / 8],
    ['−wL²/30 at the light end of a triangular load', 'fixed', rising, 0, -(w * L * L) / 30],
    ['−wL²/20 at its heavy end', 'fixed', rising, L, -(w * L * L) / 20],
    ['−wL²/8 at the built-in end of a propped beam', 'propped', uniform, 0, -(w * L * L) / 8],
    ['9wL²/128 at 5L/8 of a propped beam', 'propped', uniform, (5 * L) / 8, (9 * w * L * L) / 128],
    ['−3PL/16 at the built-in end of a propped beam', 'propped', middle, 0, (-3 * P * L) / 16],
    ['−wL²/2 at the root of a cantilever', 'cantilever', uniform, 0, -(w * L * L) / 2],
    ['−PL/2 at the root for a force half way', 'cantilever', middle, 0, (-P * L) / 2],
    ['−wL²/3 at the root for a load that rises to the tip', 'cantilever', rising, 0, -(w * L * L) / 3],
  ])('%s', (_, supports, load, x, expected) => {
    expect(of(supports, load).momentAt(x) / expected).toBeCloseTo(1, 9);
  });

  it('finds the greatest moment where the shear vanishes', () => {
    const most = greatestMoment(of('simple', rising));
    expect(most.atMm).toBeCloseTo(L / Math.sqrt(3), 3);
    expect(greatestMoment(of('propped', uniform), L / 4).atMm).toBeCloseTo((5 * L) / 8, 3);
  });

  it('finds the greatest shear on both sides of a force', () => {
    expect(greatestShear(of('propped', uniform)) / ((5 * w * L) / 8)).toBeCloseTo(1, 6);
    expect(greatestShear(of('simple', { kind: 'point', atMm: L / 4, forceN: P })) / (0.75 * P)).toBeCloseTo(1, 6);
  });

  const load = fc.oneof(
    fc.record({ kind: fc.constant('point' as const), atMm: fc.double({ min: 0, max: L, noNaN: true }), forceN: fc.double({ min: -1e5, max: 1e5, noNaN: true }) }),
    fc.tuple(fc.double({ min: 0, max: L - 10, noNaN: true }), fc.double({ min: 0.01, max: 1, noNaN: true }), fc.double({ min: -30, max: 30, noNaN: true }), fc.double({ min: -30, max: 30, noNaN: true }))
      .map(([from, share, startNPerMm, endNPerMm]): BeamLoad => ({ kind: 'distributed', fromMm: from, toMm: from + (L - from) * share, startNPerMm, endNPerMm })),
  );
  const supports = fc.constantFrom<BeamSupports>('simple', 'propped', 'fixed', 'cantilever');

  it('keeps the supports’ conditions, and adds up load by load', () => {
    fc.assert(fc.property(supports, fc.array(load, { minLength: 1, maxLength: 6 }), (kind, loads) => {
      const whole = beamDiagram({ supports: kind, spanMm: L, loads } satisfies Beam);
      const scale = 1 + loads.reduce((sum, one) => sum + Math.abs(one.kind === 'point' ? one.forceN : (Math.abs(one.startNPerMm) + Math.abs(one.endNPerMm)) * L), 0) * L;
      if (kind === 'simple') expect(Math.abs(whole.momentAt(0)) / scale).toBeLessThan(1e-9);
      if (kind !== 'fixed') expect(Math.abs(whole.momentAt(L)) / scale).toBeLessThan(1e-9);
      for (const x of [0, L / 3, L / 2, 0.9 * L]) {
        const parts = loads.reduce((sum, one) => sum + beamDiagram({ supports: kind, spanMm: L, loads: [one] }).momentAt(x), 0);
        expect(Math.abs(whole.momentAt(x) - parts) / scale).toBeLessThan(1e-9);
      }
      const most = Math.abs(greatestMoment(whole).momentNmm);
      for (let i = 0; i <= 40; i += 1) expect(Math.abs(whole.momentAt((i * L) / 40))).toBeLessThanOrEqual(most * (1 + 1e-9) + scale * 1e-9);
    }), { numRuns: 200 });
  });

  // a force almost over a support bends nothing that the sum below could see
  const away = load.filter((one) => (one.kind === 'distributed' ? one.toMm - one.fromMm > L / 10 : one.atMm > L / 50 && one.atMm < 0.98 * L));

  it('bends a built-in beam so that its ends do not turn, and a propped one so that its left end does not (∫M = 0, ∫M·(L − x) = 0)', () => {
    fc.assert(fc.property(fc.constantFrom<BeamSupports>('propped', 'fixed'), away, (kind, one) => {
      const { momentAt } = beamDiagram({ supports: kind, spanMm: L, loads: [one] });
      const n = 4000;
      let area = 0;
      let first = 0;
      let size = 1;
      for (let i = 0; i < n; i += 1) {
        const x = ((i + 0.5) * L) / n;
        area += momentAt(x);
        first += momentAt(x) * (L - x);
        size += Math.abs(momentAt(x));
      }
      if (kind === 'fixed') expect(Math.abs(area) / size).toBeLessThan(1e-3);
      // no deflection of the right end relative to the tangent at the left
      expect(Math.abs(first) / (size * L)).toBeLessThan(1e-3);
    }), { numRuns: 100 });
  });
});
