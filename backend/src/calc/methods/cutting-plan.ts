import type { CuttingPatternDto, CuttingPlanDto } from '@mantlet/common';

/** Equal pieces to cut: width across the sheet, length along it. */
export interface BoardPiece {
  widthMm: number;
  lengthMm: number;
  count: number;
}

export interface Sheet {
  lengthMm: number;
  widthMm: number;
}

interface Sized<T> {
  sizeMm: number;
  count: number;
  content: T;
}

/** Bins filled alike. */
export interface Bins<T> {
  count: number;
  restMm: number;
  contents: { content: T; count: number }[];
}

const tolerance = 1e-6;

function fitting(restMm: number, sizeMm: number, kerfMm: number, empty: boolean): number {
  // the first piece of a bin needs no cut beside it
  const available = restMm + (empty ? kerfMm : 0);
  return Math.max(0, Math.floor((available + tolerance) / (sizeMm + kerfMm)));
}

function filled<T>(bins: Bins<T>, item: Sized<T>, each: number, count: number, kerfMm: number): Bins<T> {
  const used = each * (item.sizeMm + kerfMm) - (bins.contents.length === 0 ? kerfMm : 0);
  return { count, restMm: Math.max(0, bins.restMm - used), contents: [...bins.contents, { content: item.content, count: each }] };
}

/**
 * First-fit decreasing in one dimension. Equal items and equally filled bins are handled together: the result is that of placing
 * every item by itself into the first bin with room, in a time that does not grow with the number of pieces.
 */
export function firstFitDecreasing<T>(items: readonly Sized<T>[], capacityMm: number, kerfMm: number): Bins<T>[] {
  let bins: Bins<T>[] = [];
  for (const item of [...items].sort((a, b) => b.sizeMm - a.sizeMm)) {
    let left = item.count;
    const next: Bins<T>[] = [];
    const place = (group: Bins<T>): void => {
      const each = left > 0 ? Math.min(fitting(group.restMm, item.sizeMm, kerfMm, group.contents.length === 0), left) : 0;
      if (each === 0) {
        next.push(group);
        return;
      }
      const full = Math.min(group.count, Math.floor(left / each));
      next.push(filled(group, item, each, full, kerfMm));
      left -= full * each;
      let rest = group.count - full;
      if (rest > 0 && left > 0) {
        next.push(filled(group, item, left, 1, kerfMm));
        left = 0;
        rest -= 1;
      }
      if (rest > 0) next.push({ ...group, count: rest });
    };
    for (const group of bins) place(group);
    if (left > 0) place({ count: left, restMm: capacityMm, contents: [] });
    bins = next.filter((b) => b.contents.length > 0);
  }
  return bins;
}

type Strip = CuttingPatternDto['strips'][number];

/** Stage one: pieces of one width, end to end, into strips as long as the sheet. */
function stripsOf(pieces: readonly BoardPiece[], sheet: Sheet, kerfMm: number): Sized<Strip>[] {
  const byWidth = new Map<number, Sized<BoardPiece>[]>();
  for (const piece of pieces) {
    const group = byWidth.get(piece.widthMm);
    const item = { sizeMm: piece.lengthMm, count: piece.count, content: piece };
    if (group) group.push(item);
    else byWidth.set(piece.widthMm, [item]);
  }
  return [...byWidth].flatMap(([widthMm, items]) =>
    firstFitDecreasing(items, sheet.lengthMm, kerfMm).map((bins) => ({
      sizeMm: widthMm,
      count: bins.count,
      content: {
        widthMm,
        pieces: bins.contents.flatMap(({ content, count }) =>
          Array.from({ length: count }, () => ({ lengthMm: content.lengthMm, widthMm: content.widthMm }))),
      },
    })),
  );
}

/**
 * Two-stage guillotine plan: strips are ripped along the sheet, then cut to length; both stages first-fit decreasing. The waste and the
 * number of sheets that the area alone would need are stated, so that the plan can be judged.
 * @throws RangeError where a piece is larger than the sheet
 */
export function cuttingPlan(pieces: readonly BoardPiece[], thicknessMm: number, sheet: Sheet, kerfMm: number): CuttingPlanDto {
  const tooLarge = pieces.find((p) => p.widthMm > sheet.widthMm + tolerance || p.lengthMm > sheet.lengthMm + tolerance);
  if (tooLarge) throw new RangeError(`A piece of ${tooLarge.widthMm} × ${tooLarge.lengthMm} mm is larger than the sheet`);
  const sheetBins = firstFitDecreasing(stripsOf(pieces, sheet, kerfMm), sheet.widthMm, kerfMm);
  const patterns = sheetBins.map((bins) => ({
    sheets: bins.count,
    strips: bins.contents.flatMap(({ content, count }) => Array.from({ length: count }, () => content)),
  }));
  const sheets = patterns.reduce((sum, p) => sum + p.sheets, 0);
  const areaOfSheet = (sheet.lengthMm * sheet.widthMm) / 1e6;
  const usedM2 = pieces.reduce((sum, p) => sum + (p.widthMm * p.lengthMm * p.count) / 1e6, 0);
  const sheetM2 = sheets * areaOfSheet;
  return {
    thicknessMm,
    sheetLengthMm: sheet.lengthMm,
    sheetWidthMm: sheet.widthMm,
    kerfMm,
    sheets,
    leastSheets: Math.ceil(usedM2 / areaOfSheet - 1e-9),
    usedM2,
    sheetM2,
    wasteFraction: sheetM2 > 0 ? 1 - usedM2 / sheetM2 : 0,
    patterns,
  };
}
