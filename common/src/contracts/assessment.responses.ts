import { z } from 'zod';
import { criticalTemperatureWays } from './actions.js';
import { verdictKinds } from './assessment.js';
import { messageSchema } from './messages.responses.js';
import { thicknessUnits } from './primitives.js';

/** One line of a working, as printed. */
export const workingStepDtoSchema = z.object({
  what: z.string(),
  equation: z.string(),
  inputs: z.array(z.object({ symbol: z.string(), value: z.union([z.number(), z.string()]), unit: z.string() })),
  note: z.string().optional(),
  value: z.number().nullable(),
  unit: z.string(),
  source: z.string(),
});
export type WorkingStepDto = z.infer<typeof workingStepDtoSchema>;

/** The stored outcome of one member: what the schedule prints. A number that cannot be justified is null, with a reason. */
export const memberResultDtoSchema = z.object({
  verdict: z.enum(verdictKinds),
  /** why there is no number; null for protected and bare */
  reason: messageSchema.nullable(),
  heatedPerimeterMm: z.number().nullable(),
  /** unrounded; shown to 1 1/m */
  sectionFactorPerM: z.number().nullable(),
  coatedGirthMm: z.number().nullable(),
  criticalTemperatureC: z.number().nullable(),
  /** for the bare check where κ1 differs */
  bareCriticalTemperatureC: z.number().nullable(),
  way: z.enum(criticalTemperatureWays),
  method: z.string().nullable(),
  governing: z.string().nullable(),
  /** E_fi,d / R_fi,d,0 of the governing limit state, where calculated */
  utilisation: z.number().nullable(),
  /** resting on the default of its type and not accepted */
  assumed: z.boolean(),
  /** minutes until the bare steel reaches its critical temperature; null if it never does within 240 min or not determined */
  bareMinutes: z.number().nullable(),
  /** bare steel at the end of the period (peak, for a natural fire) */
  bareTemperatureC: z.number().nullable(),
  /** what the product's data ask for; µm for coating, mm for board and spray */
  requiredThickness: z.number().nullable(),
  /** what the zone's policy gives this member: never below required */
  appliedThickness: z.number().nullable(),
  thicknessUnit: z.enum(thicknessUnits).nullable(),
  layers: z.array(z.number()).nullable(),
  productId: z.string().nullable(),
  /** where in the evidence the value was read */
  evidenceReading: z.string().nullable(),
});
export type MemberResultDto = z.infer<typeof memberResultDtoSchema>;

/** After all members were assessed anew: how many there are, and how many came out differently. */
export const recalculationDtoSchema = z.object({
  members: z.number(),
  /** whose result is another than before; 0 where the work is put to the queue */
  changed: z.number(),
  /** too many to work out at once: a worker does it */
  queued: z.boolean(),
});
export type RecalculationDto = z.infer<typeof recalculationDtoSchema>;
