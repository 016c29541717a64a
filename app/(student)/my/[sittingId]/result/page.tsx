import type { Metadata } from 'next';
import { readResult } from '@/lib/data/own/read-result';
import { pageActor, pageValue } from '@/lib/transport/page';
import { TaskHead } from '../../_components/task-head';
import { BigScore } from './_components/big-score';
import { Corrected } from './_components/corrected';
import { MeasuredResult } from './_components/measured-result';
import { StatusWords } from './_components/status-words';

export const metadata: Metadata = { title: 'result' };

export default async function ResultPage({ params }: PageProps<'/my/[sittingId]/result'>) {
  const { sittingId } = await params;
  const result = pageValue(await readResult(await pageActor(), { sittingId }));
  return (
    <>
      <TaskHead
        {...result}
        title={result.task.title}
        stage="published"
        aside={result.score === null ? null : <BigScore score={result.score} total={result.total} />}
      />
      <div className="mt-3 grid grid-cols-[minmax(0,1fr)] gap-6">
        {result.corrected ? <Corrected result={result} /> : null}
        {result.status === 'scored' && result.sheet ? (
          <MeasuredResult result={result} sheet={result.sheet} />
        ) : (
          <StatusWords status={result.status} />
        )}
      </div>
    </>
  );
}
