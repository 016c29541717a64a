import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import {
  DraftKeeper,
  type KeepState,
  type KeptDraft,
  type LocalCopy,
  type SaveReply,
} from '@/app/(teacher)/practicals/[practicalId]/_components/draft-keeper';
import { emptyDraft } from '@/lib/practicals/empty-draft';

const titled = (title: string) => emptyDraft('in', title);

/** A server that answers as it is told, or keeps everything under the next revision. */
function makeDesk(answers: (SaveReply | 'gone')[] = [], opened = 1) {
  const saves: { revision: number; title: string }[] = [];
  const states: KeepState['kind'][] = [];
  let copy: LocalCopy | null = null;
  let known: KeptDraft | null = null;
  const keeper = new DraftKeeper(opened, {
    async save(revision, content): Promise<SaveReply> {
      saves.push({ revision, title: content.title });
      const answer = answers.shift();
      if (answer === 'gone') throw new TypeError('fetch failed');
      return answer ?? { kind: 'kept', revision: revision + 1, at: '2026-12-01T10:42:00Z' };
    },
    store: {
      put: (next) => {
        copy = next;
      },
      kept: (draft) => {
        copy = null;
        known = draft;
      },
      clear: () => {
        copy = null;
      },
    },
    onState: (state) => states.push(state.kind),
  });
  return { keeper, saves, states, copy: () => copy, known: () => known };
}

beforeEach(() => void vi.useFakeTimers());
afterEach(() => void vi.useRealTimers());

describe('keeping a draft while it is typed', () => {
  it('stores it on the device at once and on the server after a pause, the last one only', async () => {
    const { keeper, saves, states, copy, known } = makeDesk();
    keeper.change(titled('B'));
    keeper.change(titled('Box'));
    expect(copy()).toMatchObject({ revision: 1, content: { title: 'Box' } });
    expect(saves).toEqual([]);
    await vi.advanceTimersByTimeAsync(1_000);
    expect(saves).toEqual([{ revision: 1, title: 'Box' }]);
    expect(states).toEqual(['keeping', 'kept']);
    expect(copy()).toBeNull();
    expect(known()).toMatchObject({ revision: 2, content: { title: 'Box' } });
  });

  it('sends what was typed during a save afterwards, on top of what that save kept', async () => {
    const { keeper, saves, copy } = makeDesk();
    keeper.change(titled('one'));
    const saving = keeper.keepNow();
    keeper.change(titled('two'));
    await saving;
    expect(copy()).toMatchObject({ content: { title: 'two' } });
    await vi.advanceTimersByTimeAsync(2_000);
    expect(saves).toEqual([
      { revision: 1, title: 'one' },
      { revision: 2, title: 'two' },
    ]);
    expect(copy()).toBeNull();
  });

  it('tries again, ever less often, while the server is gone, and loses nothing', async () => {
    const { keeper, saves, states, copy } = makeDesk(['gone', 'gone', 'gone']);
    keeper.change(titled('Box'));
    await vi.advanceTimersByTimeAsync(1_000);
    expect(states).toEqual(['keeping', 'waiting']);
    expect(copy()).toMatchObject({ content: { title: 'Box' } });
    await vi.advanceTimersByTimeAsync(2_000);
    expect(saves).toHaveLength(2);
    await vi.advanceTimersByTimeAsync(3_000);
    expect(saves).toHaveLength(2);
    await vi.advanceTimersByTimeAsync(60_000);
    expect(states.at(-1)).toBe('kept');
    expect(saves.map(({ revision }) => revision)).toEqual([1, 1, 1, 1]);
  });

  it('says that one is signed out, and goes on by itself after signing in', async () => {
    const out = { kind: 'refused', message: 'Sign in first.', signIn: true } as const;
    const { keeper, saves, states, copy } = makeDesk([out, out]);
    keeper.change(titled('Box'));
    await vi.advanceTimersByTimeAsync(1_000);
    expect(states.at(-1)).toBe('waiting');
    expect(copy()).toMatchObject({ content: { title: 'Box' } });
    expect(await keeper.keepNow()).toBe(false);
    expect(await keeper.keepNow()).toBe(true);
    expect(saves).toHaveLength(3);
    expect(copy()).toBeNull();
  });

  it('stops at a stale answer until a person chooses, and then keeps on top of the other', async () => {
    const there = { content: titled('theirs'), revision: 7, at: '2026-12-01T10:40:00Z' };
    const { keeper, saves, states } = makeDesk([{ kind: 'stale', message: 'changed', there }]);
    keeper.change(titled('mine'));
    await vi.advanceTimersByTimeAsync(1_000);
    keeper.change(titled('mine, more'));
    await vi.advanceTimersByTimeAsync(60_000);
    expect(saves).toHaveLength(1);
    expect(states.at(-1)).toBe('stale');
    keeper.settle(titled('mine, more'), there.revision);
    await vi.advanceTimersByTimeAsync(1_000);
    expect(saves.at(-1)).toEqual({ revision: 7, title: 'mine, more' });
    expect(keeper.keptRevision).toBe(8);
  });

  it('lets go of what was typed here when the other is taken', async () => {
    const there = { content: titled('theirs'), revision: 7, at: '2026-12-01T10:40:00Z' };
    const { keeper, saves, copy } = makeDesk([{ kind: 'stale', message: 'changed', there }]);
    keeper.change(titled('mine'));
    await vi.advanceTimersByTimeAsync(1_000);
    keeper.take(there);
    expect(copy()).toBeNull();
    expect(await keeper.keepNow()).toBe(true);
    expect(saves).toHaveLength(1);
    expect(keeper.keptRevision).toBe(7);
  });
});

describe('after a reload', () => {
  const opened = { content: titled('kept'), revision: 1, at: '2026-12-01T10:40:00Z' };

  it('sends what this device kept, when nothing else was kept since', async () => {
    const { keeper, saves } = makeDesk();
    keeper.bringBack({ revision: 1, content: titled('typed before'), sent: null }, opened);
    await vi.advanceTimersByTimeAsync(1_000);
    expect(saves).toEqual([{ revision: 1, title: 'typed before' }]);
  });

  it('asks first, when something else was', async () => {
    const { keeper, saves, states } = makeDesk();
    keeper.bringBack(
      { revision: 1, content: titled('typed before'), sent: null },
      { ...opened, revision: 4 },
    );
    await vi.advanceTimersByTimeAsync(60_000);
    expect(saves).toEqual([]);
    expect(states).toEqual(['stale']);
  });

  it('knows its own draft again when a save arrived whose answer it never heard', async () => {
    const arrived = { ...opened, content: titled('typed before'), revision: 2 };
    const all = makeDesk([], 2);
    all.keeper.bringBack(
      { revision: 1, content: titled('typed before'), sent: titled('typed before') },
      arrived,
    );
    await vi.advanceTimersByTimeAsync(60_000);
    expect([all.saves, all.states, all.copy()]).toEqual([[], ['kept'], null]);

    const half = makeDesk([], 2);
    half.keeper.bringBack(
      { revision: 2, content: titled('and more'), sent: titled('typed before') },
      arrived,
    );
    await vi.advanceTimersByTimeAsync(1_000);
    expect(half.saves).toEqual([{ revision: 2, title: 'and more' }]);
  });

  it('takes a stale answer that holds what it sent for the answer it missed', async () => {
    const there = { content: titled('Box'), revision: 2, at: '2026-12-01T10:40:00Z' };
    const { keeper, saves, states } = makeDesk(['gone', { kind: 'stale', message: 'changed', there }]);
    keeper.change(titled('Box'));
    await vi.advanceTimersByTimeAsync(10_000);
    expect(states.at(-1)).toBe('kept');
    expect(saves).toHaveLength(2);
    expect(keeper.keptRevision).toBe(2);
  });
});
