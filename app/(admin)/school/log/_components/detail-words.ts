type Details = Readonly<Record<string, unknown>>;

const quoted = (title: unknown) => `“${title}”`;

/** What the details of an entry say as a sentence, by the one of them that tells what was done. */
const SENTENCES: Readonly<Record<string, (details: Details) => string>> = {
  moveId: ({ from, to, holdHarmless, gain, lose, same }) =>
    `moved from version ${from} to version ${to}; ${gain} gain, ${lose} ${holdHarmless === true ? 'would lose and are held' : 'lose'}, ${same} stay`,
  undone: ({ from, to }) => `a move undone: back from version ${from} to version ${to}`,
  made: ({ made, starter }) =>
    starter === undefined ? quoted(made) : `${quoted(made)}, a copy of the starter ${starter}`,
  copied: ({ copied }) => `a copy of ${quoted(copied)}`,
  imported: ({ imported }) => `${quoted(imported)}, from a file`,
  madeVariant: ({ madeVariant }) => `${quoted(madeVariant)}, a variant`,
  exported: ({ exported, version, file }) =>
    `${quoted(exported)}, ${version === 'draft' ? 'the draft' : `version ${version}`}; file ${file}`,
  published: ({ published, version, differenceReason }) =>
    `version ${version} of ${quoted(published)} published${differenceReason === undefined ? '' : `; why it differs from the department’s: ${differenceReason}`}`,
  offered: ({ offered }) => `${quoted(offered)} offered to the department`,
  withdrawn: ({ withdrawn }) => `${quoted(withdrawn)} not on offer any more`,
  putAway: ({ putAway }) => `${quoted(putAway)} put away`,
  broughtBack: ({ broughtBack }) => `${quoted(broughtBack)} brought back`,
  tookOver: ({ tookOver, version }) => `version ${version} of its original taken into ${quoted(tookOver)}`,
  putBack: ({ putBack, insteadOfVersion }) =>
    `the draft of ${quoted(putBack)} put back in place of version ${insteadOfVersion} of its original`,
  tookBackVersion: ({ tookBackVersion }) => `version ${tookBackVersion} taken back into the draft`,
  keptDraft: ({ keptDraft }) => `the draft kept, change ${keptDraft}`,
  approved: ({ approved, version, ended }) =>
    `version ${version} of ${quoted(approved)} approved${ended === 1 ? ' in place of another' : ended ? ` in place of ${ended} others` : ''}`,
  approvalEnded: ({ approvalEnded, version }) =>
    `the approval of version ${version} of ${quoted(approvalEnded)} ended`,
  modifiedRubric: ({ modifiedRubric }) => `a modified rubric ${modifiedRubric}`,
};

/** The sentence for the details of an entry; null where they are told name by name. */
export function sentenceOf(details: Details): string | null {
  const known = Object.entries(SENTENCES).find(([name]) => details[name] !== undefined);
  return known ? known[1](details) : null;
}
