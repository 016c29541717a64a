import { z } from 'zod';
import type { Phrase } from '@/lib/practicals/compare-types';
import type { Points } from '@/lib/scoring';

const sittingId = z.uuid('This is not a sitting.');
const versionId = z.uuid('This is not a version.');

export const moveChoicesInput = z.object({ sittingId });

export const previewMoveInput = z.object({ sittingId, versionId });

/** `seen` is the preview's: what has changed since it was looked at makes the move stale. */
export const moveSittingInput = z.object({
  sittingId,
  versionId,
  holdHarmless: z.boolean(),
  seen: z.string().min(1).max(100),
});

export const undoMoveInput = z.object({ sittingId, moveId: z.uuid('This is not a move.') });

/** Another version that the sitting could stand under. */
export interface VersionChoice {
  versionId: string;
  number: number;
  publishedAt: string;
  /** What it changes of the sitting's version, a sentence each; empty where no score could ever differ. */
  changes: Phrase[];
}

/** A move that was made, standing or taken back. */
export interface MoveMade {
  moveId: string;
  number: number;
  movedAt: string;
  movedBy: string;
  /** Numbers of the versions. */
  from: number;
  to: number;
  holdHarmless: boolean;
  undone: { at: string; by: string } | null;
  /** The latest that stands, as long as nothing was published after it; by every teacher of the section. */
  canUndo: boolean;
}

/** Where a sitting stands, where it could go, and how it came there. */
export interface MoveChoices {
  sittingId: string;
  title: string;
  sectionId: string;
  sectionName: string;
  period: string;
  unit: 'in' | 'mm';
  timeZone: string;
  published: boolean;
  version: { versionId: string; number: number; publishedAt: string };
  /** The practical's other versions, the latest first. */
  others: VersionChoice[];
  /** The latest first. */
  moves: MoveMade[];
}

/** What a move, or taking one back, did. */
export interface MovedView {
  sittingId: string;
  sectionId: string;
  /** The number of the version that the sitting stands under now. */
  versionNumber: number;
  /** Attempts that were priced anew. */
  attempts: number;
}

/** One attempt before and after a move; points are of the total of that version. */
export interface MovedAttempt {
  attemptId: string;
  studentId: string;
  familyName: string;
  givenName: string;
  attemptNumber: number;
  /** Null where there is no number: not read to the end, absent, excused. */
  before: Points | null;
  after: Points | null;
  /** What it would be if nobody drops. */
  held: Points | null;
  /** After minus before on the new total's scale, in hundredths, half up; null without two numbers. */
  change: Points | null;
  /** Whether the latest publication told the student a score. */
  told: boolean;
  /** Priced by a modified rubric, before and after. */
  modified: boolean;
}

/** What moving a sitting to another version would do, before it is done. */
export interface MovePreview {
  sittingId: string;
  from: { versionId: string; number: number; total: Points };
  to: { versionId: string; number: number; total: Points };
  students: MovedAttempt[];
  /** Over the attempts with two numbers. */
  gain: number;
  same: number;
  lose: number;
  /** Mean of the changes in hundredths of a point, half up; null where nothing can be compared. */
  meanChange: Points | null;
  /** What is recorded and the new version does not ask for, by name of line or check. */
  notAsked: { label: string; attempts: number }[];
  /** Equal as long as nothing that could change this preview has changed. */
  seen: string;
}

/** A line of the preview's stream: newline-delimited JSON, progress first, the preview or a problem last. */
export type PreviewLine =
  | { kind: 'progress'; done: number; of: number }
  | { kind: 'preview'; preview: MovePreview }
  | { kind: 'problem'; message: string };
