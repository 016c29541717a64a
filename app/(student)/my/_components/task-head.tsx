import type { ReactNode } from 'react';
import { NavLinks } from '@/components/ui/nav-links';
import { PageTitle } from '@/components/ui/titles';
import type { TaskStage } from '@/lib/data/own/list-tasks';
import { DayText } from './day-text';

interface TaskHeadProps {
  sittingId: string;
  title: string;
  sectionName: string;
  period: string;
  attemptNumber: number;
  dueOn?: string | null;
  stage: TaskStage;
  /** Beside the title: the score. */
  aside?: ReactNode;
}

/** The name of the practical and where it was given; its sheets below, those that there are. */
export function TaskHead({
  sittingId,
  title,
  sectionName,
  period,
  attemptNumber,
  dueOn,
  stage,
  aside,
}: TaskHeadProps) {
  const home = `/my/${sittingId}`;
  const items = [
    { href: home, label: 'task', exact: true },
    { href: `${home}/measure`, label: stage === 'to do' ? 'measure' : 'own readings' },
    ...(stage === 'published' ? [{ href: `${home}/result`, label: 'result' }] : []),
  ];
  return (
    <header>
      <div className="flex items-start justify-between gap-4">
        <div className="min-w-0">
          <PageTitle>{title}</PageTitle>
          <p className="mt-1 text-label text-ink-2">
            {sectionName}, period {period}
            {attemptNumber > 1 ? `, attempt ${attemptNumber}` : ''}
            {dueOn ? (
              <>
                , due <DayText day={dueOn} />
              </>
            ) : null}
          </p>
        </div>
        {aside}
      </div>
      <NavLinks label="sheets of this practical" items={items} className="mt-1" />
    </header>
  );
}
