export * from './client.js';
export type { components, operations, paths } from './schema.js';
