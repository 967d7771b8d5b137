import type { SectionShape } from '@mantlet/common';
import { citation } from '../formula.js';
import type { WorkingStep } from '../formula.js';
import { coldSectionClass } from '../standards/en-1993-1-2/clause-4-2-2-classification.js';
import { bucklingReductionFormula } from '../standards/en-1993-1-2/clause-4-2-3-2-compression.js';
import { coldBucklingReductionFormula, imperfectionFactors, mostFavourableCurve, table61Source } from '../standards/en-1993-1-1/table-6-1.js';
import type { SectionClass } from '../standards/en-1993-1-1/table-5-2.js';
import type { CriticalTemperatureCase } from '../types.js';

/** What is left of the design resistance at normal temperature when the same member is read by the rules of fire at 20 °C. */
export interface ColdShare {
  share: number;
  step: WorkingStep;
}

const known = new Map<string, number>();

/**
 * Least χ_fi/χ over all slendernesses: the fire curve of EN 1993-1-2 4.2.3.2 lies below those of EN 1993-1-1 6.3.1.2, the more so the
 * more favourable the cold curve. The slenderness is not known from a utilisation, so the least counts.
 */
export function leastBucklingShare(shape: SectionShape, yieldStrengthMPa: number): number {
  const curve = mostFavourableCurve(shape, yieldStrengthMPa);
  const key = `${curve}|${yieldStrengthMPa}`;
  let least = known.get(key);
  if (least === undefined) {
    least = 1;
    for (let n = 1; n <= 800; n += 1) {
      const slenderness = n / 200;
      const fire = bucklingReductionFormula.evaluate({ slendernessInFire: slenderness, yieldStrengthMPa });
      least = Math.min(least, fire / coldBucklingReductionFormula.evaluate({ slenderness, imperfection: imperfectionFactors[curve] }));
    }
    known.set(key, least);
  }
  return least;
}

export function bucklingColdShare(c: CriticalTemperatureCase): ColdShare {
  const { yieldStrengthMPa } = c.steel;
  const curve = mostFavourableCurve(c.shape, yieldStrengthMPa);
  const share = leastBucklingShare(c.shape, yieldStrengthMPa);
  return {
    share,
    step: {
      what: 'Buckling resistance by the fire rules at 20 °C, as a share of the cold design’s', equation: 'R_fi,d,0/R_d ≥ min over λ̄ of χ_fi/χ',
      inputs: [{ symbol: 'α', value: imperfectionFactors[curve], unit: '' }, { symbol: 'f_y', value: yieldStrengthMPa, unit: 'MPa' }],
      note: `cold buckling curve ${curve}, the most favourable for this shape; the buckling length in fire is taken as no longer than the cold one`,
      value: share, unit: '', source: `EN 1993-1-2:2005 4.2.3.2 against ${citation({ ...table61Source, clause: `6.3.1.2, ${table61Source.clause}` })}`,
    },
  };
}

/**
 * A section of class 3 in fire may have been designed cold as class 1 or 2, with its plastic modulus: W_el/W_pl of that is left.
 * Null where the cold design had no more than the elastic modulus either.
 */
export function bendingColdShare(c: CriticalTemperatureCase, classInFire: SectionClass | null): ColdShare | null {
  if (classInFire !== 3 || c.shape.kind === 'angle') return null;
  // unequal flanges and tees are never called better than class 3 here, though the cold design may have done so
  const judged = c.shape.kind !== 'i-unequal' && c.shape.kind !== 'tee';
  if (judged && coldSectionClass(c.shape, 'bending', c.steel.yieldStrengthMPa) >= 3) return null;
  const { welYMm3, wplYMm3 } = c.properties;
  const share = Math.min(1, welYMm3 / wplYMm3);
  return {
    share,
    step: {
      what: 'Bending resistance by the fire rules at 20 °C, as a share of the cold design’s', equation: 'R_fi,d,0/R_d = W_el/W_pl',
      inputs: [{ symbol: 'W_el', value: welYMm3, unit: 'mm³' }, { symbol: 'W_pl', value: wplYMm3, unit: 'mm³' }],
      note: 'class 3 by the reduced ε of fire, class 1 or 2 cold', value: share, unit: '', source: 'EN 1993-1-2:2005 4.2.2 and 4.2.3.4',
    },
  };
}
