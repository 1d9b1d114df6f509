export * from './states/import.states.js';
export * from './states/inquiry.states.js';
export * from './states/quarter.states.js';
export * from './states/run.states.js';
export * from './states/state-machine.js';
