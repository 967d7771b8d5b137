import type { Deductions, SectionOutline } from '@mantlet/common';
import type { BoxSides, TakeoffMember } from './takeoff-types.js';

/** The sides of the box that the drawing marks as covered; null where protection is not boxed. */
export function boxOf(outline: SectionOutline): BoxSides | null {
  if (!outline.box) return null;
  const sides: BoxSides = { widthMm: outline.widthMm, heightMm: outline.heightMm, top: false, bottom: false, left: false, right: false };
  for (const { from, to, coated } of outline.box) {
    if (!coated) continue;
    const horizontal = Math.abs(from[1] - to[1]) < Math.abs(from[0] - to[0]);
    if (horizontal) sides[from[1] > 0 ? 'top' : 'bottom'] = true;
    else sides[from[0] > 0 ? 'right' : 'left'] = true;
  }
  return sides;
}

/** How much the outer girth grows per mm of board: 2 for every corner where two covered faces meet. */
export function girthGrowth(box: BoxSides | null): number {
  if (!box) return 0;
  const faces = [box.top, box.right, box.bottom, box.left];
  return 2 * faces.filter((covered, i) => covered && faces[(i + 1) % 4]).length;
}

/** One mark's areas in m², all pieces together. */
export interface MemberAreas {
  grossM2: number;
  endLapM2: number;
  openingM2: number;
  coatBackM2: number;
  netM2: number;
}

/**
 * Gross is coated girth × length × number, for boards the outer girth of the box. Off it come the laps at both ends and openings
 * not below the threshold; never more than there is. Coat-back of secondary steel is connections × distance × girth; it is coating or
 * spray, boards do not run on along other steel.
 */
export function memberAreas(member: TakeoffMember, deductions: Deductions): MemberAreas {
  const growth = girthGrowth(member.box);
  const girthMm = member.coatedGirthMm + growth * (member.box ? member.thickness : 0);
  const perPiece = (girthMm * member.lengthMm) / 1e6;
  const lap = Math.min((girthMm * 2 * deductions.endLapMm) / 1e6, perPiece);
  const counted = member.deductionM2 >= deductions.openingThresholdM2 ? member.deductionM2 : 0;
  const opening = Math.min(counted, perPiece - lap);
  const coatBackGirthMm = member.coatBackGirthMm > 0 ? member.coatBackGirthMm : member.coatedGirthMm;
  const coatBack = member.box ? 0 : (member.coatBackConnections * deductions.coatBackMm * coatBackGirthMm) / 1e6;
  const n = member.quantity;
  return { grossM2: perPiece * n, endLapM2: lap * n, openingM2: opening * n, coatBackM2: coatBack * n, netM2: (perPiece - lap - opening + coatBack) * n };
}
