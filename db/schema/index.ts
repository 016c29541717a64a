export * from './log';
export * from './practicals';
export * from './school';
export * from './sections';
export * from './sittings';
