export * from './formula.js';
export type * from './types.js';
export * from './standards/index.js';
export * from './methods/heating.js';
export * from './methods/fire-effect.js';
export { criticalTemperature, explainCriticalTemperature, resistanceCurve } from './methods/critical-temperature.js';
export type { ResistanceCurve } from './methods/critical-temperature.js';
