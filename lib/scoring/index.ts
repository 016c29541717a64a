export { type Dropped, type ProjectedAttempt, projectAttempt } from './project-attempt';
export { type Rescored, rescore } from './rescore';
export * from './schemas';
export { scoreAttempt } from './score-attempt';
export { ScoringError, type ScoringErrorCode } from './scoring-error';
export * from './types';
