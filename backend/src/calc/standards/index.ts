export { gasFunction, gasTemperatureC, convectionCoefficient, naturalFireDurationMin } from './gas-temperature.js';
export { parametricFire } from './en-1991-1-2/annex-a-parametric.js';
export type { ParametricFire } from './en-1991-1-2/annex-a-parametric.js';
export { netHeatFlux } from './en-1991-1-2/clause-3-1-net-heat-flux.js';
export { yieldStrength } from './en-1993-1-1/table-3-1.js';
export type { Loading, SectionClass } from './en-1993-1-1/table-5-2.js';
export { kE, kP, kY, temperatureOfKe, temperatureOfKy } from './en-1993-1-2/table-3-1.js';
export { STEEL_DENSITY_KG_PER_M3, steelSpecificHeat } from './en-1993-1-2/clause-3-4-1-thermal-properties.js';
export { sectionClass } from './en-1993-1-2/clause-4-2-2-classification.js';
