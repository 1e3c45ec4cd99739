export * from './api-error';
export * from './calculations';
export * from './people';
export * from './projects';
export * from './remarks';
export * from './revisions';
export * from './session';
export * from './ticks';
