'use client';

import { classNames } from '@/components/ui/class-names';
import { fullName, type StudentStatus, studentStatus } from '@/lib/round/students';
import { inHand } from '@/lib/round/walk';
import { useBench } from './bench-context';
import { BenchKey } from './bench-parts';

/** The roster: how far each student has come, one tap to take one up. No score stands here. */
export function StudentsPanel() {
  const { view, press, open } = useBench();
  const { state } = view;
  const student = inHand(state);
  const here = student && studentStatus(state, student);
  const names = new Map(view.inHand.map(({ attemptId, name }) => [attemptId, name]));
  return (
    <section aria-label="students" className="flex min-h-0 flex-1 flex-col gap-3 py-3">
      <div className="flex flex-wrap items-center gap-3">
        <h2 className="flex-1 text-key">Who is it?</h2>
        {student && here ? (
          <BenchKey
            onPress={() => {
              press({ do: 'standing', standing: here.standing === 'absent' ? 'expected' : 'absent' });
              open(null);
            }}
            note={fullName(student)}
            className="min-w-40"
          >
            {here.standing === 'absent' ? 'is here' : 'absent'}
          </BenchKey>
        ) : null}
        <BenchKey onPress={() => open(null)} className="min-w-28">
          close
        </BenchKey>
      </div>
      <ul className="min-h-0 flex-1 columns-1 gap-x-4 overflow-y-auto sm:columns-2 lg:columns-3">
        {state.plan.students.map((each, index) => {
          const status = studentStatus(state, each);
          const current = each.attemptId === state.attemptId;
          return (
            <li key={each.attemptId} className="break-inside-avoid">
              <button
                type="button"
                aria-current={current ? 'true' : undefined}
                onClick={() => {
                  press({ do: 'open', attemptId: each.attemptId });
                  open(null);
                }}
                className={classNames(
                  'flex min-h-[54px] w-full items-center gap-3 border-b border-hair px-2 py-1 text-left select-none active:bg-ink active:text-sheet',
                  current && 'bg-act-wash',
                )}
              >
                <span className="tnum w-7 text-right text-label text-ink-2">{index + 1}</span>
                <span className="min-w-0 flex-1">
                  <span className="block overflow-hidden text-lead leading-6 font-[620] text-ellipsis whitespace-nowrap">
                    {fullName(each)}
                  </span>
                  <span className="narrow block overflow-hidden text-label leading-5 text-ellipsis whitespace-nowrap text-ink-2">
                    {inWords(status, names.get(each.attemptId))}
                  </span>
                </span>
                <Share status={status} />
              </button>
            </li>
          );
        })}
      </ul>
    </section>
  );
}

function inWords(status: StudentStatus, elsewhere: string | undefined): string {
  const { student, standing, finished, unread, sizes, held, conflicts, skipped, begun } = status;
  if (standing !== 'expected') return standing;
  const parts = [
    student.attemptNumber > 1 ? `attempt ${student.attemptNumber}` : null,
    elsewhere ? `in hand, ${elsewhere}` : null,
    finished ? 'finished' : null,
    skipped ? 'come back' : null,
    !begun
      ? 'not read'
      : unread === 0
        ? finished
          ? null
          : 'every size read'
        : `${unread} of ${sizes} unread`,
    held > 0 ? `${held} held` : null,
    conflicts > 0 ? (conflicts === 1 ? 'two readings once' : `two readings ${conflicts} times`) : null,
  ];
  return parts.filter(Boolean).join(', ');
}

/** How much is read, as a filled rule. */
function Share({ status: { sizes, unread, standing, finished } }: { status: StudentStatus }) {
  if (standing !== 'expected') return null;
  const read = sizes === 0 ? 0 : (sizes - unread) / sizes;
  return (
    <svg aria-hidden="true" width={54} height={14} viewBox="0 0 54 14" className="shrink-0">
      <rect x={0.5} y={2.5} width={53} height={9} className="fill-plate stroke-rule" />
      <rect x={0.5} y={2.5} width={53 * read} height={9} className={finished ? 'fill-ink' : 'fill-rule'} />
    </svg>
  );
}
