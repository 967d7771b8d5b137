export { curveRefusal, groupNames, verdictOfReason } from './coverage.js';
export { checkEvidence } from './check-evidence.js';
export { regressionThickness, regressionTime } from './regression.js';
export { thicknessTableSource } from './thickness-table.js';
