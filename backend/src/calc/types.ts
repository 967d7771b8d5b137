import type {
  CriticalTemperatureBasis, CriticalTemperatureWay, DesignBasis, Evidence, Exposure, FireCurve, MemberType, Message,
  NominalCurve, Orientation, ProductKind, ProfileGroup, ProtectionForm, ReadingRules, SectionOutline, SectionProperties, SectionShape,
} from '@mantlet/common';
import type { WorkingStep } from './formula.js';

/** Something that has a value, or a stated reason for having none. Never a sentinel number. */
export type Determined<T> = { ok: true; value: T } | { ok: false; reason: Message };

export interface Steel {
  grade: string;
  /** already reduced for thickness by EN 1993-1-1 Table 3.1 */
  yieldStrengthMPa: number;
}

export interface SectionFactor {
  heatedPerimeterMm: number;
  areaMm2: number;
  /** unrounded, 1/m */
  sectionFactorPerM: number;
  /** box value with the same faces, for the shadow effect, 1/m */
  boxSectionFactorPerM: number;
  /** what is painted or sprayed (profile) or the inner girth of the box (boxed), mm */
  coatedGirthMm: number;
  /** k_sh under a nominal fire (EN 1993-1-2 4.2.5.1); 1 for convex shapes */
  shadowFactorNominal: number;
  shadowFactorOther: number;
}

export interface CriticalTemperatureCase {
  basis: CriticalTemperatureBasis;
  memberType: MemberType;
  shape: SectionShape;
  properties: SectionProperties;
  steel: Steel;
  exposure: Exposure;
  design: DesignBasis;
  /** a high or assumed temperature somebody with the role has accepted */
  accepted: boolean;
}

export interface LimitStateResult {
  name: 'tension' | 'compression' | 'bending' | 'shear' | 'lateral-torsional buckling' | 'axial force with bending' | 'cross-section';
  /** EN 1993-1-2 clause */
  clause: string;
  effect: number;
  resistanceCold: number;
  /** none where effects act together: the effect is then 1, the resistance how many times they are carried */
  unit: 'kN' | 'kNm' | '';
  /** E_fi,d / R_fi,d at 20 °C */
  utilisation: number;
  temperatureC: number;
}

export type CriticalTemperature =
  | {
      kind: 'determined';
      temperatureC: number;
      /** with κ1 for an unprotected member; equal to temperatureC where κ1 plays no part */
      bareTemperatureC: number;
      way: CriticalTemperatureWay;
      /** named on the result: 'equation (4.22)', 'inversion of k_y', 'limit states of EN 1993-1-2', 'declared', 'class 4 default', 'assumed by member type' */
      method: string;
      governing: LimitStateResult['name'] | null;
      utilisation: number | null;
      limitStates: LimitStateResult[];
      assumed: boolean;
    }
  | { kind: 'under-strength'; governing: LimitStateResult['name'] | null; utilisation: number; limitStates: LimitStateResult[]; reason: Message; way: CriticalTemperatureWay }
  | { kind: 'not-determined'; reason: Message; way: CriticalTemperatureWay };

export interface ThicknessRequest {
  group: ProfileGroup;
  orientation: Orientation;
  periodMin: number;
  curve: FireCurve;
  criticalTemperatureC: number;
  sectionFactorPerM: number;
}

/** A product's assessed data as the calculation reads them. */
export interface AssessedProduct {
  kind: ProductKind;
  evidence: Evidence;
  /** nominal curves the assessment covers */
  curves: readonly NominalCurve[];
}

export interface RequiredThickness {
  /** µm for tables and fits of coatings, mm for boards and sprays: the unit of the evidence */
  thickness: number;
  /** boards: the layers that make it up, mm */
  layers: number[] | null;
  /** in words: "R 90, 550 °C, A/V 160 to 170, open section, beam" */
  reading: string;
}

/** All that one member's assessment needs, already resolved: no ids, no lookups. */
export interface MemberCase {
  memberType: MemberType;
  shape: SectionShape;
  properties: SectionProperties;
  steel: Steel;
  exposure: Exposure;
  protectionForm: ProtectionForm;
  basis: CriticalTemperatureBasis;
  accepted: boolean;
  design: DesignBasis;
  readingRules: ReadingRules;
  periodMin: number;
  curve: FireCurve;
  /** null: the zone has no system for this member type */
  product: { id: string; kind: ProductKind; evidence: Evidence; curves: NominalCurve[]; expired: boolean; name: string } | null;
}

export type { CriticalTemperatureBasis, SectionOutline, WorkingStep };
