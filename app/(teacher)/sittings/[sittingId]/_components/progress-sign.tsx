import type { SittingStudentView } from '@/lib/data/sittings/read-sitting';
import { count } from '../../../_components/names';

const STANDING = { absent: 'absent', excused: 'excused', zero: 'zero' };

/** Where a student's pieces stand, as a drawn square and in words. */
export function ProgressSign({ student }: { student: SittingStudentView }) {
  const { standing, progress, finished, conflicts } = student;
  if (standing !== 'expected') {
    return <span className="border-b border-dashed border-ink-2">{STANDING[standing]}</span>;
  }
  const words =
    progress === 'not read' ? 'not read' : progress === 'begun' ? 'begun' : finished ? 'finished' : 'read';
  return (
    <span className="inline-flex items-center gap-x-2 whitespace-nowrap">
      <svg
        aria-hidden
        viewBox="0 0 14 14"
        className="size-3.5 shrink-0 stroke-ink [stroke-width:var(--pen-inside)]"
      >
        <rect x="1" y="1" width="12" height="12" className={progress === 'read' ? 'fill-ink' : 'fill-none'} />
        {progress === 'begun' ? <path d="M1 13V1H13Z" className="fill-ink" /> : null}
      </svg>
      <span className={progress === 'not read' ? 'text-ink-2' : undefined}>{words}</span>
      {conflicts > 0 ? <strong>{count(conflicts, 'size', 'sizes')} with two readings</strong> : null}
    </span>
  );
}
