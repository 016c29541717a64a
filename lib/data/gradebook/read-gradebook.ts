import 'server-only';
import { selectMissingNumbers } from '@/db/queries/attempts';
import { selectFiles } from '@/db/queries/gradebook';
import { selectRoster } from '@/db/queries/rosters';
import { selectSection, selectSections } from '@/db/queries/sections';
import type { Actor } from '@/lib/auth/actor';
import { may } from '@/lib/auth/policy';
import { type GradebookCell, type GradebookView, gradebookInput } from '@/lib/contracts/gradebook';
import { asSectionView, sectionSubject } from '../sections/section-view';
import { defineVerb } from '../verb';
import { cellOf, isChanged } from './gradebook-cells';
import { type LoadedSitting, loadSittings } from './load-gradebook';
import { termMean } from './term-mean';

const FILES_SHOWN = 10;

/** A section's students by its practicals. Looking at it is logged once an hour. */
export const readGradebook = defineVerb({
  action: 'gradebook.read',
  input: gradebookInput,
  async run({ actor, input, tx, authorize, found, logView }): Promise<GradebookView> {
    const { schoolId } = actor;
    const { sectionId } = input;
    const section = found(await selectSection(tx, schoolId, sectionId));
    const subject = sectionSubject(section);
    authorize(subject);
    const sittings = await loadSittings(tx, schoolId, sectionId);
    const missing = await selectMissingNumbers(
      tx,
      schoolId,
      sittings.map(({ sittingId }) => sittingId),
    );
    const byAttempt = sumByAttempt(missing);
    const mayExport = may(actor, 'grades.export', subject);
    const files = mayExport ? await selectFiles(tx, schoolId, sectionId, FILES_SHOWN) : [];
    const siblings = (await selectSections(tx, schoolId, scopeOf(actor))).filter(
      ({ termId }) => termId === section.termId,
    );
    await logView({ subjectKind: 'section', subjectId: sectionId, details: { sittings: sittings.length } });
    const roster = await selectRoster(tx, schoolId, sectionId);
    return {
      section: asSectionView(section),
      sections: siblings.map(({ sectionId: id, name, period }) => ({ sectionId: id, name, period })),
      sittings: sittings.map((sitting) => headOf(sitting, missing)),
      students: roster.map(({ studentId, localId, familyName, givenName, joinedOn, leftOn }) => {
        const cells = sittings.map((sitting) => cellIn(sitting, studentId, byAttempt));
        return { studentId, localId, familyName, givenName, joinedOn, leftOn, cells, mean: meanOf(cells) };
      }),
      files: files.map(asFile),
      may: { export: mayExport, change: may(actor, 'sitting.change', subject) },
      timeZone: section.timeZone,
    };
  },
});

type Missing = Awaited<ReturnType<typeof selectMissingNumbers>>;

/** Readings that have not arrived, as far as it is certain whose they are. */
function sumByAttempt(missing: Missing): Map<string, number> {
  const sums = new Map<string, number>();
  for (const row of missing.filter(({ sameAttempt }) => sameAttempt)) {
    sums.set(row.attemptId, (sums.get(row.attemptId) ?? 0) + row.missing);
  }
  return sums;
}

type FileRow = Awaited<ReturnType<typeof selectFiles>>[number];

function asFile(file: FileRow): GradebookView['files'][number] {
  return {
    fileId: file.fileId,
    kind: file.kind,
    fileName: file.fileName,
    sentAt: file.exportedAt.toISOString(),
    sentBy: `${file.givenName} ${file.familyName}`.trim(),
    rows: file.rowCount,
    bytes: file.byteCount,
    sha256: file.sha256,
  };
}

function scopeOf({ role, personId, departmentId }: Actor) {
  return role === 'head' ? { departmentId: departmentId ?? personId } : { teacherId: personId };
}

function headOf(sitting: LoadedSitting, missing: Missing): GradebookView['sittings'][number] {
  const { sittingId, title, open, openedAt, version, latest, attempts, pricingOf } = sitting;
  const notArrived = missing
    .filter((row) => row.sittingId === sittingId)
    .reduce((sum, row) => sum + row.missing, 0);
  return {
    sittingId,
    title,
    open,
    openedAt: openedAt.toISOString(),
    versionNumber: latest?.version.number ?? version.number,
    publication: latest && {
      number: latest.publication.number,
      publishedAt: latest.publication.publishedAt.toISOString(),
      changedSince: attempts.filter((row) =>
        isChanged({ row, result: latest.results.get(row.attemptId) }, pricingOf(row.attemptId)),
      ).length,
    },
    notArrived,
  };
}

function cellIn(
  { attempts, latest, version, pricingOf }: LoadedSitting,
  studentId: string,
  notArrived: ReadonlyMap<string, number>,
): GradebookCell | null {
  const own = attempts.filter((row) => row.studentId === studentId);
  return cellOf(
    own.map((row) => ({ row, result: latest?.results.get(row.attemptId) })),
    (latest?.version ?? version).form.policies.redo,
    {
      pricingOf,
      notArrived: own.reduce((sum, { attemptId }) => sum + (notArrived.get(attemptId) ?? 0), 0),
    },
  );
}

function meanOf(cells: readonly (GradebookCell | null)[]): number | null {
  return termMean(
    cells.flatMap((cell) =>
      cell?.published && cell.score !== null ? [{ score: cell.score, total: cell.total }] : [],
    ),
  );
}
