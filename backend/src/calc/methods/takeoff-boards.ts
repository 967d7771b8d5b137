import type { BoardPiece, Sheet } from './cutting-plan.js';
import type { BoxSides } from './takeoff-types.js';

/**
 * Widths of the boards of one layer round a box, mm. Boards on top and bottom cover the edges of those at the sides, as is usual on
 * site (common practice); every layer encloses the ones within it.
 */
export function faceWidths(box: BoxSides, withinMm: number, layerMm: number): number[] {
  const across = Number(box.left) + Number(box.right);
  const upright = Number(box.top) + Number(box.bottom);
  const lying = box.widthMm + across * (withinMm + layerMm);
  const standing = box.heightMm + upright * withinMm;
  return [...(box.top ? [lying] : []), ...(box.bottom ? [lying] : []), ...(box.left ? [standing] : []), ...(box.right ? [standing] : [])];
}

/** Shorter ends than this are made up by the joint. */
const leastPieceMm = 1;

function alongMember(runMm: number, moduleMm: number): number[] {
  const whole = Math.floor(runMm / moduleMm + 1e-9);
  const rest = runMm - whole * moduleMm;
  return [...Array.from({ length: whole }, () => moduleMm), ...(rest >= leastPieceMm ? [rest] : [])];
}

/**
 * Pieces that cover one face of a member. A face wider than the sheet is covered by pieces turned across it; one wider than the sheet is
 * long, by panels of equal width side by side.
 */
export function facePieces(faceMm: number, lengthMm: number, sheet: Sheet): BoardPiece[] {
  if (faceMm > sheet.widthMm && faceMm <= sheet.lengthMm) {
    return alongMember(lengthMm, sheet.widthMm).map((run) => ({ widthMm: run, lengthMm: faceMm, count: 1 }));
  }
  const panels = Math.ceil(faceMm / sheet.widthMm - 1e-9);
  return alongMember(lengthMm, sheet.lengthMm).map((run) => ({ widthMm: faceMm / panels, lengthMm: run, count: panels }));
}

/** Collects pieces by layer thickness, equal ones counted together. */
export class PieceList {
  private readonly byThickness = new Map<number, Map<string, BoardPiece>>();

  add(thicknessMm: number, pieces: readonly BoardPiece[], times: number): void {
    let list = this.byThickness.get(thicknessMm);
    if (!list) this.byThickness.set(thicknessMm, (list = new Map()));
    for (const piece of pieces) {
      // to a hundredth of a millimetre: finer differences are not cut
      const widthMm = Math.round(piece.widthMm * 100) / 100;
      const lengthMm = Math.round(piece.lengthMm * 100) / 100;
      const key = `${widthMm}x${lengthMm}`;
      const known = list.get(key);
      if (known) known.count += piece.count * times;
      else list.set(key, { widthMm, lengthMm, count: piece.count * times });
    }
  }

  entries(): [thicknessMm: number, pieces: BoardPiece[]][] {
    return [...this.byThickness].sort((a, b) => a[0] - b[0]).map(([t, list]) => [t, [...list.values()]]);
  }

  /** area of board in place, m² */
  areaM2(thicknessMm: number): number {
    let sum = 0;
    for (const p of this.byThickness.get(thicknessMm)?.values() ?? []) sum += (p.widthMm * p.lengthMm * p.count) / 1e6;
    return sum;
  }

  addAll(other: PieceList): void {
    for (const [thicknessMm, pieces] of other.entries()) this.add(thicknessMm, pieces, 1);
  }
}

/** All pieces of one mark. */
export function memberPieces(member: { box: BoxSides; layers: readonly number[]; lengthMm: number; quantity: number }, endLapMm: number, sheet: Sheet): PieceList {
  const list = new PieceList();
  const runMm = Math.max(0, member.lengthMm - 2 * endLapMm);
  let within = 0;
  for (const layer of member.layers) {
    for (const face of faceWidths(member.box, within, layer)) list.add(layer, facePieces(face, runMm, sheet), member.quantity);
    within += layer;
  }
  return list;
}
