/** Film thickness of coatings is counted in µm, boards and sprays in mm. */
export type ThicknessUnit = 'µm' | 'mm';

export function thicknessToMm(value: number, unit: ThicknessUnit): number {
  return unit === 'µm' ? value / 1000 : value;
}
