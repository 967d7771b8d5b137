import type { ReadingRules } from '@mantlet/common';
import { curveRefusal } from '../standards/en-13381/coverage.js';
import { thicknessFromFits } from '../standards/en-13381/regression.js';
import { thicknessFromTables } from '../standards/en-13381/thickness-table.js';
import type { AssessedProduct, Determined, RequiredThickness, ThicknessRequest } from '../types.js';
import { thicknessFromThermal } from './thermal-thickness.js';

/**
 * The least thickness of a product that its assessed data give for a period, design temperature and section factor, in the unit of
 * the evidence (µm coating, mm board and spray). The bare steel's own time is within the data and is not subtracted.
 * Refusals tell by `verdictOfReason` whether the case is outside the assessment or not determined.
 */
export function requiredThickness(product: AssessedProduct, request: ThicknessRequest, rules: ReadingRules): Determined<RequiredThickness> {
  const refusal = curveRefusal(product, request.curve);
  if (refusal) return { ok: false, reason: refusal };
  const { evidence, kind } = product;
  if (evidence.form === 'table') return thicknessFromTables(evidence.tables, kind, request, rules);
  if (evidence.form === 'regression') return thicknessFromFits(evidence.fits, kind, request);
  return thicknessFromThermal(evidence.properties, kind, request);
}
