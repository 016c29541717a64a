'use client';

import { Mark } from '@/components/shell/mark';
import { classNames } from '@/components/ui/class-names';
import { fullName } from '@/lib/round/students';
import { inHand } from '@/lib/round/walk';
import { useBench } from './bench-context';
import { ENTRIES } from './bench-settings';
import { KeptAndSent } from './kept-and-sent';
import { useWide } from './use-wide';

function sizeOfName(name: string, crowded: boolean): string {
  const short = crowded ? 17 : 22;
  if (name.length <= short) return 'text-[31px]';
  return name.length <= short + 5 ? 'text-[25px]' : 'text-[20px]';
}

/** The head of the bench: whose pieces these are, the ways to enter a reading, and what has been kept. */
export function Strip() {
  const { view, bundle, panel, open, lock, practice } = useBench();
  const { state } = view;
  const student = inHand(state);
  const at = state.plan.students.findIndex(({ attemptId }) => attemptId === state.attemptId);
  const rubric = bundle.versionNumber === null ? 'draft' : `rubric ${bundle.versionNumber}`;
  return (
    <header className="flex flex-wrap items-stretch border-b-edge border-ink lg:h-[66px] lg:flex-nowrap">
      <div className="flex min-w-0 flex-[1_1_16rem] items-end gap-4 pr-3">
        <Mark className="h-11 w-auto shrink-0" />
        <div className="min-w-0">
          <p className="narrow overflow-hidden text-label text-ellipsis whitespace-nowrap text-ink-2">
            {practice ? 'practice, ' : ''}Period {bundle.period}, {bundle.task.title}, {rubric}
          </p>
          <h1
            className={classNames(
              'overflow-hidden font-title font-[620] text-ellipsis whitespace-nowrap',
              sizeOfName(student ? fullName(student) : '', view.inHand.length > 0),
              'pb-1 leading-9',
            )}
          >
            {student ? fullName(student) : 'no students'}
            {student && student.attemptNumber > 1 ? (
              <span className="font-text text-lead"> attempt {student.attemptNumber}</span>
            ) : null}
          </h1>
        </div>
      </div>
      <StripKey label="student" pressed={panel === 'students'} onPress={() => open('students')}>
        <span className="font-[660]">{at + 1}</span> of{' '}
        <span className="font-[660]">{state.plan.students.length}</span>
      </StripKey>
      <Others />
      <EntrySwitch />
      <KeptAndSent />
      <div className="flex border-rule max-lg:flex-1 max-lg:border-t max-lg:[&>*]:flex-1">
        <PlainKey pressed={panel === 'set-up'} onPress={() => open('set-up')}>
          set up
        </PlainKey>
        <PlainKey onPress={lock}>lock</PlainKey>
      </div>
    </header>
  );
}

function StripKey(props: {
  label: string;
  pressed: boolean;
  onPress: () => void;
  children: React.ReactNode;
}) {
  return (
    <button
      type="button"
      onClick={props.onPress}
      aria-expanded={props.pressed}
      className={classNames(
        'flex min-h-14 flex-col justify-center border-l border-rule px-3 text-left select-none active:bg-ink active:text-sheet',
        props.pressed && 'bg-ink text-sheet',
      )}
    >
      <span className={classNames('text-label', props.pressed ? '' : 'text-ink-2')}>{props.label}</span>
      <span className="text-lead whitespace-nowrap underline decoration-[1.5px] underline-offset-4">
        {props.children}
      </span>
    </button>
  );
}

/** Whose pieces the other tablets have, so that nobody measures the same ones. */
function Others() {
  const { view } = useBench();
  const names = new Map(view.state.plan.students.map((student) => [student.attemptId, student]));
  const others = view.inHand.flatMap(({ attemptId, name, deviceId }) => {
    const student = names.get(attemptId);
    return student
      ? [{ deviceId, name, student: fullName(student), here: attemptId === view.state.attemptId }]
      : [];
  });
  const [first, ...more] = others.sort((a, b) => Number(b.here) - Number(a.here));
  if (!first) return null;
  return (
    <div
      className={classNames(
        'flex min-h-14 min-w-0 flex-col justify-center border-rule px-3 max-lg:w-full max-lg:border-t lg:flex-[0_1_10.5rem] lg:border-l',
        first.here && 'border-b-edge border-b-refuse',
      )}
      role="status"
    >
      <p className="narrow overflow-hidden text-label text-ellipsis whitespace-nowrap text-ink-2">
        {first.here ? 'also in hand' : `in hand, ${first.name}`}
        {more.length > 0 ? `, and ${more.length} more` : ''}
      </p>
      <p className="narrow overflow-hidden text-lead font-[660] text-ellipsis whitespace-nowrap">
        {first.here ? first.name : first.student}
      </p>
    </div>
  );
}

function EntrySwitch() {
  const { settings, change, open } = useBench();
  // Fewer than three graduations fit a phone: there the keypad stands for the rule.
  const wide = useWide();
  const entries = wide ? ENTRIES : ENTRIES.filter((entry) => entry !== 'rule');
  const used = !wide && settings.entry === 'rule' ? 'keypad' : settings.entry;
  return (
    <fieldset
      aria-label="how a reading is entered"
      className="flex border-rule max-lg:border-t max-lg:[&>*]:flex-1 max-lg:flex-1 lg:border-l"
    >
      {entries.map((entry) => (
        <button
          key={entry}
          type="button"
          aria-pressed={used === entry}
          onClick={() => {
            change({ entry });
            open(null);
          }}
          className={classNames(
            'narrow min-h-14 min-w-[80px] px-2 text-lead font-[640] select-none not-first:border-l not-first:border-rule',
            used === entry ? 'bg-act text-on-act' : 'active:bg-ink active:text-sheet',
          )}
        >
          {entry}
        </button>
      ))}
    </fieldset>
  );
}

function PlainKey(props: { pressed?: boolean; onPress: () => void; children: string }) {
  return (
    <button
      type="button"
      onClick={props.onPress}
      aria-expanded={props.pressed}
      className={classNames(
        'narrow min-h-14 min-w-[62px] border-l border-rule px-2 text-lead font-[640] whitespace-nowrap select-none active:bg-ink active:text-sheet',
        props.pressed && 'bg-ink text-sheet',
      )}
    >
      {props.children}
    </button>
  );
}
