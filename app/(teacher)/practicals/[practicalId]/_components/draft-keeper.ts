import { type PracticalDraft, practicalDraftSchema } from '@/lib/practicals/draft';

export interface KeptDraft {
  content: PracticalDraft;
  revision: number;
  at: string;
}

export type SaveReply =
  | { kind: 'kept'; revision: number; at: string }
  | { kind: 'stale'; message: string; there: KeptDraft }
  | { kind: 'refused'; message: string; signIn: boolean };

/** Where what is typed stands: kept on the server, on its way, or on this device alone. */
export type KeepState =
  | { kind: 'kept'; at: string }
  | { kind: 'keeping' }
  | { kind: 'waiting'; message: string; signIn: boolean }
  | { kind: 'stale'; message: string; there: KeptDraft };

/** What was typed on this device and the server has not confirmed; `sent` went out, and may have arrived unheard. */
export interface LocalCopy {
  revision: number;
  content: PracticalDraft;
  sent: PracticalDraft | null;
}

export interface LocalStore {
  put(copy: LocalCopy): void;
  /** All that was typed is kept on the server as this; a page asked for just before does not know it yet. */
  kept(draft: KeptDraft): void;
  clear(): void;
}

interface Connections {
  save(revision: number, content: PracticalDraft): Promise<SaveReply>;
  store: LocalStore;
  onState(state: KeepState): void;
}

const PAUSE = 800;
const FIRST_RETRY = 2_000;
const LONGEST_RETRY = 30_000;
const MOVED_ON =
  'This practical was changed in another place since you typed here. Nothing you typed is lost: choose which one to keep.';
const SIGNED_OUT = 'You are signed out. What you typed is on this device and is sent when you are back:';
const NOT_REACHED = 'The server does not answer. What you typed is on this device and is sent when it does.';

/** Whether two drafts say the same; a database gives keys back in its own order. */
function isSameDraft(a: PracticalDraft, b: PracticalDraft): boolean {
  const inOrder = (draft: PracticalDraft) => JSON.stringify(practicalDraftSchema.parse(draft));
  return a === b || inOrder(a) === inOrder(b);
}

/**
 * Keeps a draft while it is typed: on the device at once, on the server after each pause, one save at a time. A save
 * that fails for a moment is repeated with growing waits; one that is stale waits for a person to choose.
 */
export class DraftKeeper {
  private latest: PracticalDraft | null = null;
  private timer: ReturnType<typeof setTimeout> | null = null;
  private running: Promise<void> | null = null;
  private retry = FIRST_RETRY;
  private stale = false;
  private sent: PracticalDraft | null = null;

  constructor(
    private revision: number,
    private readonly to: Connections,
  ) {}

  /** The revision that the server last confirmed. */
  get keptRevision(): number {
    return this.revision;
  }

  change(draft: PracticalDraft): void {
    this.latest = draft;
    this.store();
    if (!this.stale) this.schedule(PAUSE);
  }

  /** Goes on with what this device kept, unless the server has moved on from what that was typed into. */
  bringBack(copy: LocalCopy, opened: KeptDraft): void {
    if (isSameDraft(copy.content, opened.content)) {
      this.take(opened);
      return;
    }
    const arrived = copy.sent !== null && isSameDraft(copy.sent, opened.content);
    if (copy.revision === opened.revision || arrived) {
      this.change(copy.content);
      return;
    }
    this.latest = copy.content;
    this.stale = true;
    this.to.onState({ kind: 'stale', message: MOVED_ON, there: opened });
  }

  /** Saves now what is not kept yet; true when all is kept. */
  async keepNow(): Promise<boolean> {
    this.cancel();
    if (this.running) await this.running;
    if (this.latest && !this.stale) await this.run();
    return this.latest === null;
  }

  /** Keeps the draft over what was kept in another place. */
  settle(draft: PracticalDraft, revision: number): void {
    this.stale = false;
    this.sent = null;
    this.revision = revision;
    this.change(draft);
  }

  /** Takes what was kept in another place; what was typed here is let go. */
  take(there: KeptDraft): void {
    this.stale = false;
    this.latest = null;
    this.sent = null;
    this.revision = there.revision;
    this.to.store.clear();
    this.to.onState({ kind: 'kept', at: there.at });
  }

  stop(): void {
    this.cancel();
  }

  private store(): void {
    const { revision, latest, sent } = this;
    if (latest) this.to.store.put({ revision, content: latest, sent });
  }

  private cancel(): void {
    if (this.timer) clearTimeout(this.timer);
    this.timer = null;
  }

  private schedule(wait: number): void {
    this.cancel();
    this.timer = setTimeout(() => void this.run(), wait);
  }

  private run(): Promise<void> {
    this.running ??= this.save().finally(() => {
      this.running = null;
      if (this.latest && !this.stale && !this.timer) this.schedule(PAUSE);
    });
    return this.running;
  }

  private async save(): Promise<void> {
    const sent = this.latest;
    if (!sent) return;
    this.cancel();
    this.sent = sent;
    this.store();
    this.to.onState({ kind: 'keeping' });
    const reply = await this.to
      .save(this.revision, sent)
      .catch((): SaveReply => ({ kind: 'refused', message: NOT_REACHED, signIn: false }));
    if (reply.kind === 'kept') this.onKept(sent, reply);
    else if (reply.kind === 'stale' && isSameDraft(sent, reply.there.content)) this.onKept(sent, reply.there);
    else if (reply.kind === 'stale') {
      this.stale = true;
      this.to.onState(reply);
    } else {
      const { signIn } = reply;
      this.to.onState({ kind: 'waiting', message: signIn ? SIGNED_OUT : reply.message, signIn });
      this.schedule(this.retry);
      this.retry = Math.min(this.retry * 2, LONGEST_RETRY);
    }
  }

  private onKept(sent: PracticalDraft, { revision, at }: { revision: number; at: string }): void {
    this.revision = revision;
    this.retry = FIRST_RETRY;
    this.sent = null;
    if (this.latest === sent) {
      this.latest = null;
      this.to.store.kept({ content: sent, revision, at });
    } else if (this.latest) {
      this.store();
    }
    this.to.onState({ kind: 'kept', at });
  }
}
