export * from './factories.js';
export * from './harness.js';
