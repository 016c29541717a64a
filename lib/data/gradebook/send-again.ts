import 'server-only';
import { createHash } from 'node:crypto';
import { selectFile } from '@/db/queries/gradebook';
import { selectSection } from '@/db/queries/sections';
import { fileInput } from '@/lib/contracts/gradebook';
import { log as processLog } from '@/lib/log';
import { store } from '@/lib/storage';
import { sectionSubject } from '../sections/section-view';
import { defineVerb } from '../verb';

export interface KeptFileView {
  fileName: string;
  bytes: Uint8Array;
  sha256: string;
}

/** A file that went out before, byte for byte; one whose bytes are no longer the same is not sent. */
export const sendAgain = defineVerb({
  action: 'grades.export',
  input: fileInput,
  async run({ actor, input, tx, authorize, found, refuse, log }): Promise<KeptFileView> {
    const file = found(await selectFile(tx, actor.schoolId, input.fileId));
    const section = found(await selectSection(tx, actor.schoolId, file.sectionId));
    authorize(sectionSubject(section));
    const bytes = await readBytes(file.storageKey).catch((error: unknown) => {
      processLog.error({ err: error }, 'a kept file could not be read');
      return refuse('unavailable', 'The store for files does not answer. Try again in a moment.', {
        retryAfter: 10,
      });
    });
    if (!bytes || createHash('sha256').update(bytes).digest('hex') !== file.sha256) {
      return refuse('conflict', 'This file is no longer kept as it was sent. Export the results again.');
    }
    const { fileName, sha256 } = file;
    await log({
      subjectKind: 'section',
      subjectId: file.sectionId,
      details: { again: true, fileId: file.fileId, fileName, sha256 },
    });
    return { fileName, bytes, sha256 };
  },
});

async function readBytes(storageKey: string): Promise<Uint8Array | null> {
  return (await store()?.getObject(storageKey))?.bytes ?? null;
}
