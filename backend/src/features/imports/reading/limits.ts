/** What a member schedule may reasonably be; anything beyond is refused before it costs much. */
export const fileLimits = {
  uploadBytes: 10 * 1024 * 1024,
  unpackedBytes: 100 * 1024 * 1024,
  /** a schedule's XML packs 10 to 30 times; 200 is beyond any real one */
  packRatio: 200,
  zipEntries: 2000,
  rows: 50_000,
  columns: 200,
  cells: 1_000_000,
  cellCharacters: 2000,
  /** a workbook stores a text once however many cells show it: without this a small file could fill the memory */
  characters: 20_000_000,
} as const;
export const megabytes = (bytes: number): number => Math.round(bytes / 1024 / 1024);
