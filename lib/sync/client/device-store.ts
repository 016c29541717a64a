import Dexie, { type EntityTable } from 'dexie';
import type { RoundBundle, StoredEvent } from '@/lib/contracts/rounds';
import type { ReadingEvent } from '../protocol';

/** Marks that only this device needs: which press made the event, and which press that press took back. */
export interface PressMark {
  press: string | null;
  undoes: string | null;
}

/** An event that the server has not answered for yet, or has refused. It leaves by an answer alone. */
export interface OutboxRow extends PressMark {
  id: string;
  sittingId: string;
  authorId: string;
  deviceId: string;
  sequence: number;
  state: 'waiting' | 'refused';
  reason: string | null;
  event: ReadingEvent;
}

/** An event that the server has; `mine` was made on this device. */
export interface ReadingRow extends PressMark {
  id: string;
  sittingId: string;
  mine: 0 | 1;
  event: StoredEvent;
}

export interface RoundRow {
  key: string;
  bundle: RoundBundle;
}

export interface MetaRow {
  key: string;
  value: unknown;
}

/**
 * What this browser keeps. A change of its shape is a new `version()` beside the old ones, with an upgrade that carries
 * every row over: nothing here is ever dropped by an update.
 */
export class DeviceStore extends Dexie {
  outbox!: EntityTable<OutboxRow, 'id'>;
  readings!: EntityTable<ReadingRow, 'id'>;
  rounds!: EntityTable<RoundRow, 'key'>;
  meta!: EntityTable<MetaRow, 'key'>;

  constructor(name = 'trymark') {
    // A reading is "kept" once it is on the disk, not once the browser means to write it.
    super(name, { chromeTransactionDurability: 'strict' });
    this.version(1).stores({
      outbox: 'id, sittingId, authorId, [authorId+state], [deviceId+sequence]',
      readings: 'id, sittingId, [sittingId+mine]',
      rounds: 'key',
      meta: 'key',
    });
  }
}

let open: DeviceStore | undefined;

/** The one store of this page. */
export function deviceStore(): DeviceStore {
  open ??= new DeviceStore();
  return open;
}
