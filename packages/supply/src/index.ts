export * from './lead-time.js';
export * from './reorder.js';
