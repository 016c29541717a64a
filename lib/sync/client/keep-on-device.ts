import type { ReadingEvent } from '../protocol';
import { takeSequences } from './device-id';
import type { DeviceStore, OutboxRow, PressMark } from './device-store';

export type DraftEvent = Omit<ReadingEvent, 'sequence'>;

/**
 * Writes events to the device's store and outbox in one transaction and gives back the rows as stored. When this
 * resolves they are on the disk; when it rejects none of them is, and nothing may show them as kept.
 */
export async function keepOnDevice(
  store: DeviceStore,
  sittingId: string,
  drafts: readonly DraftEvent[],
  mark: PressMark = { press: null, undoes: null },
): Promise<OutboxRow[]> {
  return store.transaction('rw', store.meta, store.outbox, async () => {
    const { deviceId, first } = await takeSequences(store, drafts.length);
    const rows = drafts.map((draft, index): OutboxRow => {
      const sequence = first + index;
      return {
        id: draft.id,
        sittingId,
        authorId: draft.authorId,
        deviceId,
        sequence,
        state: 'waiting',
        reason: null,
        event: { ...draft, supersedes: [...draft.supersedes], sequence },
        ...mark,
      };
    });
    await store.outbox.bulkAdd(rows);
    return rows;
  });
}
