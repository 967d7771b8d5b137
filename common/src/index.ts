export * from './contracts/primitives.js';
export * from './contracts/sections.js';
export * from './contracts/fire.js';
export * from './contracts/actions.js';
export * from './contracts/products.js';
export * from './contracts/settings.js';
export * from './contracts/assessment.js';
export * from './errors/index.js';
