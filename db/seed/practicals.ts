import type { Transaction } from '@/db/client';
import { practicalDrafts, practicals, rubricVersions } from '@/db/schema';
import type { PracticalDraft } from '@/lib/practicals/draft';
import { parseDraft } from '@/lib/practicals/parse-draft';
import type { StarterId } from '@/lib/practicals/starter-plans';
import { starterDraft } from '@/lib/practicals/starters';
import type { Task } from '@/lib/practicals/task';
import type { Rubric } from '@/lib/scoring';
import { ENGINE_VERSION } from '@/lib/scoring/engine-version';
import type { RubricForm } from '@/lib/scoring/rubric-form';
import type { SeededSchool } from './people';
import type { Random } from './random';

export interface SeededVersion {
  id: string;
  practicalId: string;
  number: number;
  task: Task;
  form: RubricForm;
  rubric: Rubric;
}

interface PracticalPlan {
  key: string;
  starter: StarterId;
  owner: string;
  school: 'cedar-fork' | 'ardmore';
  publishedOn: string;
  copiedFrom?: string;
  /** Since when its teacher offers it to the department. */
  offeredOn?: string;
  /** Why it differs from what the department approved, in its teacher's words. */
  reason?: string;
  /** What its teacher changed in the starter before publishing version 1. */
  change?(draft: PracticalDraft): void;
  /** A correction, published later as version 2; its sittings stay on the version they were opened under. */
  correction?: { on: string; change(draft: PracticalDraft): void };
}

/** Leaving a guide out was cheaper than cutting one badly; seen only after the first grades were out. */
export function cheapMissingGuide(draft: PracticalDraft): void {
  for (const line of draft.lines) if (line.id === 'guide') line.missing = '6';
}

/** Short cuts are charged from 1/64 on, twice as dear: the room next door pays more for the same wood. */
function dearerShortCuts(draft: PracticalDraft): void {
  draft.all.sizes.length = {
    ...draft.all.sizes.length,
    mirrored: false,
    under: {
      bands: [
        { within: '1/64', lose: '0' },
        { within: '1/32', lose: '1' },
        { within: '1/16', lose: '2' },
        { within: '3/32', lose: '4' },
      ],
      beyond: '5',
    },
  };
  draft.reading.margin = '0';
}

function coarserBands(draft: PracticalDraft): void {
  for (const axis of ['thickness', 'width', 'length'] as const) {
    const side = {
      bands: [
        { within: '1', lose: '0' },
        { within: '2', lose: '1' },
      ],
      beyond: '3',
    };
    draft.all.sizes[axis] = { ...draft.all.sizes[axis], over: side, under: structuredClone(side) };
  }
}

const PRACTICALS: PracticalPlan[] = [
  {
    key: 'bench-hook',
    starter: 'bench-hook',
    owner: 'lindqvist',
    school: 'cedar-fork',
    publishedOn: '2026-09-08',
    offeredOn: '2026-09-09',
    change: cheapMissingGuide,
    correction: {
      on: '2026-10-05',
      change: (draft) => {
        for (const line of draft.lines) line.missing = '';
      },
    },
  },
  {
    key: 'six-stick',
    starter: 'six-stick',
    owner: 'lindqvist',
    school: 'cedar-fork',
    publishedOn: '2026-10-12',
    offeredOn: '2026-10-13',
  },
  {
    key: 'desk-caddy',
    starter: 'desk-caddy',
    owner: 'lindqvist',
    school: 'cedar-fork',
    publishedOn: '2026-11-02',
    offeredOn: '2026-11-03',
  },
  {
    key: 'desk-caddy-okonjo',
    starter: 'desk-caddy',
    owner: 'okonjo',
    school: 'cedar-fork',
    publishedOn: '2026-11-05',
    copiedFrom: 'desk-caddy',
    change: dearerShortCuts,
    reason: 'Period 5 glues its caddies up the same week: a short end leaves a gap that cannot be closed.',
  },
  {
    key: 'stair-tower',
    starter: 'stair-tower',
    owner: 'lindqvist',
    school: 'cedar-fork',
    publishedOn: '2026-11-23',
  },
  {
    key: 'gauge-kit',
    starter: 'gauge-kit',
    owner: 'brandt',
    school: 'ardmore',
    publishedOn: '2026-11-02',
    offeredOn: '2026-11-02',
  },
  {
    key: 'gauge-kit-sorley',
    starter: 'gauge-kit',
    owner: 'sorley',
    school: 'ardmore',
    publishedOn: '2026-11-03',
    copiedFrom: 'gauge-kit',
    change: coarserBands,
  },
  { key: 'wall-rack', starter: 'wall-rack', owner: 'brandt', school: 'ardmore', publishedOn: '2026-11-24' },
];

/** The practicals of a school with their published versions; gives back the first version of each by its key. */
export async function seedPracticals(
  tx: Transaction,
  random: Random,
  school: SeededSchool,
): Promise<Map<string, SeededVersion>> {
  const first = new Map<string, SeededVersion>();
  for (const plan of PRACTICALS.filter((each) => each.school === school.plan.code)) {
    first.set(plan.key, await seedPractical(tx, random, school, plan, first));
  }
  return first;
}

async function seedPractical(
  tx: Transaction,
  random: Random,
  school: SeededSchool,
  plan: PracticalPlan,
  before: Map<string, SeededVersion>,
): Promise<SeededVersion> {
  const ownerId = school.staff.get(plan.owner);
  if (!ownerId) throw new Error(`${plan.owner} is not on the staff`);
  const draft = starterDraft(plan.starter);
  plan.change?.(draft);
  const practicalId = random.uuid();
  const source = plan.copiedFrom ? before.get(plan.copiedFrom) : undefined;
  await tx.insert(practicals).values({
    schoolId: school.id,
    id: practicalId,
    departmentId: school.departmentId,
    ownerId,
    title: draft.title,
    unit: draft.unit,
    ...(source && { copiedFromVersionId: source.id, sourceKind: 'adopted' as const }),
    ...(plan.offeredOn && { offeredAt: morningOf(plan.offeredOn) }),
    createdAt: morningOf(plan.publishedOn),
  });
  const version = await seedVersion(
    tx,
    random,
    school,
    practicalId,
    ownerId,
    draft,
    1,
    plan.publishedOn,
    plan.reason,
  );
  if (plan.correction) {
    plan.correction.change(draft);
    await seedVersion(tx, random, school, practicalId, ownerId, draft, 2, plan.correction.on);
  }
  await tx.insert(practicalDrafts).values({
    schoolId: school.id,
    practicalId,
    content: draft,
    revision: 1,
    savedBy: ownerId,
    savedAt: morningOf(plan.correction?.on ?? plan.publishedOn),
  });
  return version;
}

async function seedVersion(
  tx: Transaction,
  random: Random,
  school: SeededSchool,
  practicalId: string,
  ownerId: string,
  draft: PracticalDraft,
  number: number,
  day: string,
  differenceReason?: string,
): Promise<SeededVersion> {
  const parsed = parseDraft(draft);
  if (!parsed.ok) throw new Error(`the demo's ${draft.title} cannot be read: ${JSON.stringify(parsed)}`);
  const { task, form, rubric } = parsed;
  const id = random.uuid();
  await tx.insert(rubricVersions).values({
    schoolId: school.id,
    id,
    practicalId,
    number,
    task,
    form,
    rubric,
    engineVersion: ENGINE_VERSION,
    differenceReason,
    publishedBy: ownerId,
    publishedAt: morningOf(day),
  });
  return { id, practicalId, number, task, form, rubric };
}

export function morningOf(day: string): Date {
  return new Date(`${day}T14:30:00Z`);
}
