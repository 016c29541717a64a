import type { RoundBundle } from '@/lib/contracts/rounds';
import type { PracticalView } from '@/lib/data/practicals/read-practical';
import { parseDraft } from '@/lib/practicals/parse-draft';

/** Nobody real: three students for a round that is thrown away. */
const INVENTED = [
  ['Wilhelmina', 'Dovetail'],
  ['Casimir', 'Spokeshave'],
  ['Oona', 'Winding'],
] as const;

/** A made-up round on the draft where it can be read, else on the latest version; null when neither can be. */
export function practiceBundle(practical: PracticalView): RoundBundle | null {
  const draft = parseDraft(practical.draft.content);
  const from = draft.ok ? { ...draft, number: null } : practical.latest;
  if (!from) return null;
  return {
    sittingId: practical.practicalId,
    published: false,
    sectionName: 'nobody’s',
    period: '0',
    schoolName: '',
    task: from.task,
    rubric: from.rubric,
    versionNumber: from.number,
    students: INVENTED.map(([givenName, familyName], index) => ({
      attemptId: `00000000-0000-4000-8000-00000000000${index + 1}`,
      attemptNumber: 1,
      studentId: `00000000-0000-4000-8000-00000000001${index + 1}`,
      givenName,
      familyName,
    })),
    events: [],
    authors: {},
    inHand: { others: [], benchEvents: 0 },
    may: { finish: true, settle: true },
  };
}
