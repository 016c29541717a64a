export * from './accommodations';
export * from './log';
export * from './practicals';
export * from './results';
export * from './school';
export * from './sections';
export * from './sittings';
