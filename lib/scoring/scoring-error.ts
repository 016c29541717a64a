export type ScoringErrorCode =
  | 'unknown-line'
  | 'unknown-check'
  | 'repeated-piece'
  | 'ordinal-out-of-range'
  | 'level-out-of-range';

/** What an attempt holds that its rubric does not allow. Scoring refuses it; nothing is ignored. */
export class ScoringError extends Error {
  readonly code: ScoringErrorCode;

  constructor(code: ScoringErrorCode, message: string) {
    super(message);
    this.name = 'ScoringError';
    this.code = code;
  }
}
