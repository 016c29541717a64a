export * from './schemas';
export { ScoringError, type ScoringErrorCode } from './scoring-error';
export * from './types';
