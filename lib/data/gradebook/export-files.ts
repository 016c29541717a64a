import 'server-only';
import { createHash } from 'node:crypto';
import type { z } from 'zod';
import { insertFile } from '@/db/queries/gradebook';
import { selectSection } from '@/db/queries/sections';
import { exportInput } from '@/lib/contracts/gradebook';
import { writeCsv } from '@/lib/csv/write-csv';
import { log as processLog } from '@/lib/log';
import { store } from '@/lib/storage';
import { sectionSubject } from '../sections/section-view';
import { type Context, defineVerb } from '../verb';
import { CSV_TYPE } from './csv-type';
import { type CsvTable, type ExportSection, gradesTable, sizesTable } from './export-rows';
import { exportFileName } from './file-name';
import { type LoadedSitting, loadSittings } from './load-gradebook';
import { loadPlainSheets, type PlainSheets } from './plain-sheets';

export interface SentFileView {
  /** Null where this installation keeps no files. */
  fileId: string | null;
  fileName: string;
  text: string;
  sha256: string;
  rows: number;
}

type Send = Context<z.output<typeof exportInput>>;

/** The published results of a section as a file, kept so that it can be sent again byte for byte. */
export const exportGrades = exporter('grades', gradesTable);

/** The same with one row a size. */
export const exportSizes = exporter('sizes', sizesTable);

function exporter(
  kind: 'grades' | 'sizes',
  tableOf: (section: ExportSection, sittings: readonly LoadedSitting[], plain: PlainSheets) => CsvTable,
) {
  return defineVerb({
    action: 'grades.export',
    input: exportInput,
    async run(context): Promise<SentFileView> {
      const { actor, input, tx, authorize, found, log } = context;
      const section = found(await selectSection(tx, actor.schoolId, input.sectionId));
      authorize(sectionSubject(section));
      const sittings = await publishedSittings(context);
      const table = tableOf(section, sittings, await loadPlainSheets(tx, actor.schoolId, sittings));
      const text = writeCsv(table.header, table.rows);
      const subject = input.sittingId ? (sittings[0]?.title ?? '') : section.name;
      const fileName = exportFileName({ period: section.period, subject, kind });
      const sha256 = createHash('sha256').update(text).digest('hex');
      const rows = table.rows.length;
      const fileId = await keepFile(context, { kind, fileName, text, sha256, rows });
      await log({
        subjectKind: 'section',
        subjectId: input.sectionId,
        details: {
          kind,
          fileName,
          sha256,
          rows,
          fileId,
          sittings: sittings.map(({ sittingId }) => sittingId),
        },
      });
      return { fileId, fileName, text, sha256, rows };
    },
  });
}

/** The sitting that was asked for, or all of the section, as far as they are published. */
async function publishedSittings({ actor, input, tx, found, refuse }: Send): Promise<LoadedSitting[]> {
  const all = await loadSittings(tx, actor.schoolId, input.sectionId);
  const chosen = input.sittingId ? [found(all.find(({ sittingId }) => sittingId === input.sittingId))] : all;
  const published = chosen.filter(({ latest }) => latest !== null);
  if (published.length === 0) {
    refuse(
      'conflict',
      'Nothing is published here yet. Publish a sitting first; then its results can go out.',
    );
  }
  return published;
}

interface MadeFile {
  kind: 'grades' | 'sizes';
  fileName: string;
  text: string;
  sha256: string;
  rows: number;
}

/** Named by its content, so that the same file is kept once, and one that was rolled back harms nothing. */
async function keepFile({ actor, input, tx, refuse }: Send, file: MadeFile): Promise<string | null> {
  const bucket = store();
  if (!bucket) return null;
  const storageKey = `exports/${actor.schoolId}/${file.sha256}.csv`;
  try {
    await bucket.putObject(storageKey, file.text, CSV_TYPE);
  } catch (error) {
    processLog.error({ err: error }, 'an exported file could not be kept');
    refuse('unavailable', 'The store for files does not answer. Nothing was sent; try again in a moment.', {
      retryAfter: 10,
    });
  }
  return insertFile(tx, {
    schoolId: actor.schoolId,
    sectionId: input.sectionId,
    kind: file.kind,
    fileName: file.fileName,
    storageKey,
    sha256: file.sha256,
    byteCount: Buffer.byteLength(file.text),
    rowCount: file.rows,
    exportedBy: actor.personId,
  });
}
