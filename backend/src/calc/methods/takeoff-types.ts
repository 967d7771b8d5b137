import type { Deductions, MemberType, ProductKind, ProductSupply, ProfileGroup } from '@mantlet/common';

/** The box round a member and which of its faces carry board. */
export interface BoxSides {
  widthMm: number;
  heightMm: number;
  top: boolean;
  bottom: boolean;
  left: boolean;
  right: boolean;
}

/** A member that carries protection, with what the takeoff needs to know of it. */
export interface TakeoffMember {
  id: string;
  mark: string;
  levelId: string;
  zoneId: string;
  productId: string;
  memberType: MemberType;
  group: ProfileGroup;
  onSite: boolean;
  quantity: number;
  lengthMm: number;
  /** what is coated or sprayed; boards: girth of the box at zero thickness */
  coatedGirthMm: number;
  /** needed for boards only */
  box: BoxSides | null;
  /** applied thickness by the zone's policy: µm coating, mm board and spray */
  thickness: number;
  layers: readonly number[] | null;
  /** connections of unprotected secondary steel onto one piece, and that steel's girth; 0: the member's own girth */
  coatBackConnections: number;
  coatBackGirthMm: number;
  /** openings and faces not to be protected on one piece, m² */
  deductionM2: number;
}

export interface TakeoffProduct {
  id: string;
  name: string;
  kind: ProductKind;
  supply: ProductSupply;
}

export interface TakeoffOptions {
  deductions: Deductions;
  /** whole containers, sheets and bags: once for the project, or once for each level's delivery */
  delivery: 'project' | 'level';
  /** width of a saw cut through board, mm; 3 is common practice */
  kerfMm: number;
  /** decimal places of the currency */
  moneyPlaces: number;
}

export const defaultKerfMm = 3;
