export * from './convert.js';
export * from './format.js';
export * from './money.js';
export * from './thickness.js';
