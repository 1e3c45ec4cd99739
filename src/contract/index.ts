export * from './access';
export * from './errors';
export * from './live';
export * from './projects';
export * from './revisions';
export * from './session';
