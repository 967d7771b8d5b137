import type { AcceptanceDto, VerdictKind } from '@mantlet/common';

/** What an acceptance needs to know of a member; rows and sheets both have it. */
export interface Acceptable { id: string; mark: string; assumed: boolean; criticalTemperatureC: number | null; verdict: VerdictKind | null }
export type AcceptanceKind = AcceptanceDto['kind'];

/** The members of a choice to which each kind of acceptance applies. The server checks the same again. */
export function acceptable(members: readonly Acceptable[], secondSignatureAboveC: number): Record<AcceptanceKind, Acceptable[]> {
  return {
    assumed: members.filter((m) => m.assumed),
    'high-temperature': members.filter((m) => m.criticalTemperatureC !== null && m.criticalTemperatureC > secondSignatureAboveC),
    bare: members.filter((m) => m.verdict === 'bare'),
  };
}
