import type { ReactNode } from 'react';
import { classNames } from '@/components/ui/class-names';
import { PageTitle } from '@/components/ui/titles';
import { TitleBlock, type TitleBlockCell } from './title-block';

interface DeskPageProps {
  title: ReactNode;
  /** One quiet line beside the title: "26 students, spring term". */
  note?: ReactNode;
  /** Steps or tabs of this page. */
  tabs?: ReactNode;
  /** Buttons, right of the title. */
  actions?: ReactNode;
  /** The narrow column at the right; on a phone it follows the content. */
  aside?: ReactNode;
  /** The title line runs on above the narrow column: for pages with both steps and buttons. */
  wideHead?: boolean;
  titleBlock?: readonly TitleBlockCell[];
  children: ReactNode;
}

/** The inside of a desk sheet: title line, content, the column beside it, the title block in the corner. */
export function DeskPage(props: DeskPageProps) {
  const { title, note, tabs, actions, aside, wideHead = false, titleBlock, children } = props;
  const head = (
    <div
      className={classNames(
        'mb-4 flex flex-wrap items-center gap-x-8 gap-y-3',
        wideHead && aside && 'xl:col-span-2',
      )}
    >
      <PageTitle className="min-w-0">{title}</PageTitle>
      {note ? <p className="text-label text-ink-2">{note}</p> : null}
      {tabs}
      {actions ? (
        <div className="flex flex-wrap items-center gap-2 md:ml-auto print:hidden">{actions}</div>
      ) : null}
    </div>
  );
  return (
    <div
      className={classNames(
        'grid flex-1 grid-cols-[minmax(0,1fr)] gap-x-8',
        aside ? 'xl:grid-cols-[minmax(0,1fr)_20rem]' : '',
        wideHead && 'grid-rows-[auto_auto_1fr] xl:grid-rows-[auto_1fr]',
      )}
    >
      {wideHead ? head : null}
      <div className="min-w-0">
        {wideHead ? null : head}
        {children}
      </div>
      {aside || titleBlock ? (
        <div className={classNames('flex min-w-0 flex-col pt-8', aside && 'xl:pt-0')}>
          {aside}
          {titleBlock ? (
            <div className="mt-auto pt-8">
              <TitleBlock
                cells={titleBlock}
                className={classNames(
                  '-mx-4 -mb-4 border-l-0 md:-mr-6 md:-mb-6 md:ml-auto md:w-[22rem] md:border-l',
                  aside && 'xl:ml-0 xl:w-auto',
                )}
              />
            </div>
          ) : null}
        </div>
      ) : null}
    </div>
  );
}
