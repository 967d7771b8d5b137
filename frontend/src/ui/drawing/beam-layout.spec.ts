import { describe, expect, it } from 'vitest';
import { beamInWords } from './beam-drawing.js';
import { layOutBeam } from './beam-layout.js';
import type { BeamToDraw } from './beam-layout.js';

const full = (value: number, fromMm = 0, toMm = 8000) => ({ kind: 'distributed', action: 'permanent', fromMm, toMm, startKnPerM: value, endKnPerM: value }) as const;
const force = (atMm: number | null, forceKn: number | null) => ({ kind: 'point', action: 'B', atMm, forceKn }) as const;
const beam = (loads: BeamToDraw['loads'], more: Partial<BeamToDraw> = {}): BeamToDraw => ({ supports: 'simple', spanMm: 8000, loads, lateralSupportsMm: [], ...more });

describe('the drawing of a beam', () => {
  it('places loads and lateral supports to scale along the span', () => {
    const drawn = layOutBeam(beam([full(10, 2000, 6000), force(4000, 50)], { lateralSupportsMm: [4000, null, 9000] }), 668)!;
    const at = (mm: number) => drawn.left + (mm / 8000) * (drawn.right - drawn.left);
    expect(drawn.loads[0]).toMatchObject({ from: at(2000), to: at(6000) });
    expect(drawn.loads[1]).toMatchObject({ from: at(4000), to: at(4000) });
    expect(drawn.lateral).toEqual([at(4000)]);
  });
  it('keeps ordinates of one kind in proportion', () => {
    const drawn = layOutBeam(beam([full(10), full(5), force(1000, 80)]), 668)!;
    expect(drawn.loads[1]!.start).toBeCloseTo(drawn.loads[0]!.start / 2);
    expect(drawn.loads[2]!.start).toBe(drawn.loads[0]!.start);
  });
  it.each([320, 600])('lets no load or figure cover another at %i px', (width) => {
    const drawn = layOutBeam(beam([full(10), full(5), force(1000, 80), force(1200, 81.25), full(4, 5000, 5100), force(8000, 3)]), width)!;
    const boxes = drawn.loads.map((load) => ({ base: load.base, from: Math.min(load.from, load.label.x - load.label.text.length * 2.6), to: Math.max(load.to, load.label.x + load.label.text.length * 2.6) }));
    for (const [i, a] of boxes.entries()) for (const b of boxes.slice(i + 1)) if (a.base === b.base) expect(a.to <= b.from || b.to <= a.from, `${JSON.stringify(a)} ${JSON.stringify(b)}`).toBe(true);
    for (const load of drawn.loads) expect(load.label.y).toBeGreaterThan(8);
  });
  it('draws nothing it does not know, and says which loads are missing', () => {
    expect(layOutBeam(beam([full(10)], { spanMm: null }), 600)).toBeNull();
    expect(layOutBeam(beam([full(10)], { spanMm: 0 }), 600)).toBeNull();
    expect(layOutBeam(beam([full(10), force(null, 5), force(9000, 5), full(1, 3000, 3000)]), 600)!.missing).toEqual([2, 3, 4]);
  });
  it('says the same in words', () => {
    const described = beam([full(12.5), force(4000, -30)], { supports: 'fixed', lateralSupportsMm: [4000] });
    expect(beamInWords(described, layOutBeam(described, 600)!))
      .toBe('Built in at both ends, span 8\u202f000 mm. Loads: 1: 12.5 kN/m; 2: \u221230 kN. Held sideways between its ends at 4\u202f000 mm.');
  });
});
