export { parseCatalogue } from './catalogue.js';
export type { CatalogueSection } from './catalogue.js';
export { normaliseDesignation, suggestDesignations } from './designation.js';
export { determineSectionOutline, sectionOutline } from './outline.js';
export { profileGroup } from './profile-group.js';
export { determineSectionProperties, massOfArea, sectionProperties, steelDensityKgPerM3 } from './properties.js';
export { sectionFactor } from './section-factor.js';
export { shapeFault } from './shape-fault.js';
