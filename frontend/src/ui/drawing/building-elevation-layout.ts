/** What the elevation needs of a building; the contract's BuildingLevelDto has it. */
export interface ElevationZone {
  id: string; code: string; name: string; periodMin: number; protectedAreaM2: number;
  members: number; settled: number; open: number; issuedMembers: number;
  /** being recalculated: the area is not known until then */
  unassessed?: number;
}
export interface ElevationLevel { id: string; code: string; name: string; elevationM: number; heightM: number; zones: readonly ElevationZone[] }

export interface ZoneBox<Z extends ElevationZone = ElevationZone> {
  zone: Z; level: ElevationLevel;
  x: number; y: number; width: number; height: number;
  /** widths of the shares of members settled, issued and open, from the left, the left and the right */
  settledWidth: number; issuedWidth: number; openWidth: number;
}
/** A step of the scale bar, filled and empty by turns. */
export interface ScaleStep { fromM: number; toM: number; y: number; height: number }
export interface LevelMark { level: ElevationLevel; y: number; labelY: number }
export interface ElevationLayout {
  width: number; height: number; plotLeft: number; plotWidth: number; pxPerM: number;
  /** y of the project's datum, null where the building does not reach it */
  groundY: number | null;
  boxes: ZoneBox[]; emptyBands: { level: ElevationLevel; x: number; y: number; width: number; height: number }[]; marks: LevelMark[];
}

/** At the right there is room for the scale bar, where the drawing is wide enough for one. */
const paddingOf = (width: number) => ({ top: 26, right: width < wideFrom ? 12 : 64, bottom: 22 });
/** From here on the drawing has dashed level lines and a scale bar. */
export const wideFrom = 520;
const leastZoneWidth = 62;
const leastMarkGap = 15;
/** A level with less than this share of the largest level's area is drawn narrower, like a plant room on a roof. */
const narrowBelow = 0.5;
const sameElevationM = 0.05;

const areaOf = (zones: readonly ElevationZone[]) => zones.reduce((sum, z) => sum + Math.max(0, z.protectedAreaM2), 0);

/**
 * Splits a width in proportion to the areas, none below the least width (or an equal share, where even that does not fit).
 * The parts sum to the width.
 */
export function widthsByArea(areas: readonly number[], width: number, least = leastZoneWidth): number[] {
  if (areas.length === 0) return [];
  const floor = Math.min(least, width / areas.length);
  const fixed = new Set<number>();
  for (;;) {
    const freeWidth = width - fixed.size * floor;
    const freeArea = areas.reduce((sum, a, i) => (fixed.has(i) ? sum : sum + Math.max(0, a)), 0);
    const share = (a: number) => (freeArea > 0 ? (Math.max(0, a) / freeArea) * freeWidth : freeWidth / (areas.length - fixed.size));
    const below = areas.findIndex((a, i) => !fixed.has(i) && share(a) < floor - 1e-9);
    if (below < 0) return areas.map((a, i) => (fixed.has(i) ? floor : share(a)));
    fixed.add(below);
  }
}

/** Levels at one elevation (two wings) share a band; a band ends at the next level above it, so that none overlap. */
function bandsOf(levels: readonly ElevationLevel[]) {
  const bands: { fromM: number; toM: number; levels: ElevationLevel[] }[] = [];
  for (const level of [...levels].sort((a, b) => a.elevationM - b.elevationM)) {
    const last = bands.at(-1);
    if (last && level.elevationM - last.fromM < sameElevationM) {
      last.levels.push(level);
      last.toM = Math.max(last.toM, level.elevationM + level.heightM);
    } else bands.push({ fromM: level.elevationM, toM: level.elevationM + level.heightM, levels: [level] });
  }
  bands.forEach((band, i) => { band.toM = Math.min(band.toM, bands[i + 1]?.fromM ?? Infinity); });
  return bands;
}

/** Storeys come out legible (82 px for the middle one, more on a large sheet) while the whole stays within a screen and a half. */
function scaleOf(bands: { fromM: number; toM: number }[], width: number, storeyPx: number): number {
  const heights = bands.map((b) => b.toM - b.fromM).sort((a, b) => a - b);
  const middle = heights[Math.floor(heights.length / 2)] ?? 4;
  const totalM = (bands.at(-1)?.toM ?? 0) - (bands[0]?.fromM ?? 0);
  return Math.max(Math.min(8, storeyPx / middle), Math.min(storeyPx / middle, Math.max(1100, width * 0.9) / Math.max(totalM, 1), 46));
}

/** Level marks that would sit on each other are moved apart; the triangle stays at the true height. */
function spreadMarks(marks: LevelMark[]): void {
  marks.sort((a, b) => a.y - b.y);
  for (let i = marks.length - 2; i >= 0; i--) {
    const below = marks[i + 1];
    const mark = marks[i];
    if (mark && below) mark.labelY = Math.min(mark.labelY, below.labelY - leastMarkGap);
  }
}

/** Heights to one scale; within a level, widths by protected area. Pixels of the given total width. */
export function layoutElevation(levels: readonly ElevationLevel[], width: number, storeyPx = Math.max(82, Math.min(width * 0.085, 124))): ElevationLayout {
  const padding = paddingOf(width);
  const plotLeft = width < wideFrom ? 66 : 104;
  const plotWidth = Math.max(120, width - plotLeft - padding.right);
  const bands = bandsOf(levels);
  const pxPerM = scaleOf(bands, width, storeyPx);
  const topM = bands.at(-1)?.toM ?? 0;
  const bottomM = bands[0]?.fromM ?? 0;
  const yOf = (m: number) => padding.top + (topM - m) * pxPerM;
  const largest = Math.max(0, ...bands.map((b) => areaOf(b.levels.flatMap((l) => l.zones))));
  const layout: ElevationLayout = {
    width, height: padding.top + (topM - bottomM) * pxPerM + padding.bottom, plotLeft, plotWidth, pxPerM,
    groundY: bands.length && bottomM <= 0 && topM >= 0 ? yOf(0) : null, boxes: [], emptyBands: [], marks: [],
  };
  for (const band of bands) {
    const y = yOf(band.toM);
    const height = yOf(band.fromM) - y;
    const zones = band.levels.flatMap((level) => level.zones.map((zone) => ({ zone, level })));
    const first = band.levels[0];
    const share = largest > 0 ? areaOf(zones.map((z) => z.zone)) / largest : 1;
    const least = Math.min(plotWidth, Math.max(zones.length * leastZoneWidth * 1.6, plotWidth * 0.3));
    const bandWidth = zones.length === 0 || share >= narrowBelow ? plotWidth : Math.max(least, plotWidth * share);
    let x = plotLeft + (plotWidth - bandWidth) / 2;
    if (zones.length === 0 && first) layout.emptyBands.push({ level: first, x, y, width: bandWidth, height });
    const widths = widthsByArea(zones.map((z) => z.zone.protectedAreaM2), bandWidth);
    zones.forEach(({ zone, level }, i) => {
      const w = widths[i] ?? 0;
      const part = (n: number) => (zone.members > 0 ? (w * Math.min(n, zone.members)) / zone.members : 0);
      layout.boxes.push({ zone, level, x, y, width: w, height, settledWidth: part(zone.settled), issuedWidth: part(zone.issuedMembers), openWidth: part(zone.open) });
      x += w;
    });
    if (first) layout.marks.push({ level: first, y: y + height, labelY: y + height });
  }
  spreadMarks(layout.marks);
  return layout;
}

/** Beside the wall, from the lowest floor up: four steps of 1, 2, 5 or 10 m, as many as the building is high enough for. */
export function scaleBar(layout: ElevationLayout): { x: number; steps: ScaleStep[] } | null {
  if (layout.width < wideFrom || layout.boxes.length + layout.emptyBands.length === 0) return null;
  const bottom = Math.max(...[...layout.boxes, ...layout.emptyBands].map((b) => b.y + b.height));
  const top = Math.min(...[...layout.boxes, ...layout.emptyBands].map((b) => b.y));
  const stepM = [1, 2, 5, 10, 20, 50].find((m) => m * layout.pxPerM >= 22) ?? 50;
  const steps = Math.min(4, Math.floor((bottom - top) / (stepM * layout.pxPerM) + 1e-6));
  if (steps < 1) return null;
  return {
    x: layout.plotLeft + layout.plotWidth + 22,
    steps: Array.from({ length: steps }, (_, i) => ({ fromM: i * stepM, toM: (i + 1) * stepM, y: bottom - (i + 1) * stepM * layout.pxPerM, height: stepM * layout.pxPerM })),
  };
}

/** Cuts a text to about a width, for a face whose letters take 0.54 of its size. */
export function fitText(text: string, widthPx: number, sizePx: number): string {
  const letters = Math.floor(widthPx / (sizePx * 0.54));
  if (text.length <= letters) return text;
  return letters < 3 ? '' : `${text.slice(0, letters - 1).trimEnd()}…`;
}
