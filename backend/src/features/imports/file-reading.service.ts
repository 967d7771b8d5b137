/** Reading of uploaded files, for other features that take tables in. */
export { columnLetters } from './reading/cell-grid.js';
export type { CellGrid } from './reading/cell-grid.js';
export { decodeText } from './reading/decode-text.js';
export { fileKind } from './reading/file-kind.js';
export { inspectZip } from './reading/inspect-zip.js';
export { readSchedule } from './reading/read-schedule.js';
export { provenDecimalSign, readNumber } from './rows/numbers.js';
