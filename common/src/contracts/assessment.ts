import type { Message } from '../errors/message.js';
import type { CriticalTemperatureWay } from './actions.js';

/** One line of a working, as printed. */
export interface WorkingStepDto {
  what: string;
  equation: string;
  inputs: { symbol: string; value: number | string; unit: string }[];
  note?: string;
  value: number | null;
  unit: string;
  source: string;
}

export const verdictKinds = ['protected', 'bare', 'not-determined', 'outside', 'under-strength'] as const;
/**
 * protected: needs the stated thickness · bare: may stay bare · not-determined: something is missing ·
 * outside: the product's assessment does not reach · under-strength: fails before any fire
 */
export type VerdictKind = (typeof verdictKinds)[number];

/** The stored outcome of one member: what the schedule prints. A number that cannot be justified is null, with a reason. */
export interface MemberResultDto {
  verdict: VerdictKind;
  /** why there is no number; null for protected and bare */
  reason: Message | null;
  heatedPerimeterMm: number | null;
  /** unrounded; shown to 1 1/m */
  sectionFactorPerM: number | null;
  coatedGirthMm: number | null;
  criticalTemperatureC: number | null;
  /** for the bare check where κ1 differs */
  bareCriticalTemperatureC: number | null;
  way: CriticalTemperatureWay;
  method: string | null;
  governing: string | null;
  /** E_fi,d / R_fi,d,0 of the governing limit state, where calculated */
  utilisation: number | null;
  /** resting on the default of its type and not accepted */
  assumed: boolean;
  /** minutes until the bare steel reaches its critical temperature; null if it never does within 240 min or not determined */
  bareMinutes: number | null;
  /** bare steel at the end of the period (peak, for a natural fire) */
  bareTemperatureC: number | null;
  /** what the product's data ask for; µm for coating, mm for board and spray */
  requiredThickness: number | null;
  /** what the zone's policy gives this member: never below required */
  appliedThickness: number | null;
  thicknessUnit: 'µm' | 'mm' | null;
  layers: number[] | null;
  productId: string | null;
  /** where in the evidence the value was read */
  evidenceReading: string | null;
}
