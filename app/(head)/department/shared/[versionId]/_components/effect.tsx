import { SquareHistogram } from '@/components/charts/square-histogram';
import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import { Heading, Verdict } from '@/components/ui/titles';
import type { SectionEffect, SharedVersionView } from '@/lib/data/department/read-shared-version';
import { sayPeriod, signedTenths, tenths } from '../../_components/words';
import { type ChangeScale, changeScale, sayScale, sayVerdict } from './effect-words';

/** What the version would make of every section's recorded readings of its cut list. */
export function Effect({ view }: { view: SharedVersionView }) {
  const { sections, scale } = view;
  if (sections.length === 0) {
    return (
      <section aria-labelledby="effect-heading">
        <Heading id="effect-heading">What it would do</Heading>
        <p className="mt-2 max-w-[62ch]">
          No section has readings of this cut list that are read to the end. As soon as one has, you see here
          what this rubric would make of them.
        </p>
      </section>
    );
  }
  return (
    <section aria-labelledby="effect-heading" className="grid grid-cols-[minmax(0,1fr)] gap-4">
      <Heading id="effect-heading">What it would do</Heading>
      <Verdict className="max-w-[60ch]">{sayVerdict(view)}</Verdict>
      <p className="max-w-[75ch] text-label text-ink-2">
        Recorded readings priced again, nothing measured anew and nothing changed. {sayScale(scale)} Each
        student’s latest attempt that is read to the end, without the bonus of a prediction.
      </p>
      <EffectTable sections={sections} />
      <Spread sections={sections} />
    </section>
  );
}

function EffectTable({ sections }: { sections: SectionEffect[] }) {
  return (
    <Table caption="mean score of each section, as it is now and under this version">
      <TableHead>
        <tr>
          <HeadCell>section</HeadCell>
          <HeadCell className="max-md:hidden">priced now by</HeadCell>
          <HeadCell align="right">students</HeadCell>
          <HeadCell align="right">mean now</HeadCell>
          <HeadCell align="right">under it</HeadCell>
          <HeadCell align="right">change</HeadCell>
        </tr>
      </TableHead>
      <TableBody>
        {sections.map((section) => (
          <tr key={section.sittingId}>
            <RowHead>
              <span className="first-letter:uppercase">{sayPeriod(section.period)}</span>
              <span className="block text-small font-[440] text-ink-2">
                {section.sectionName}, {section.termName}
              </span>
            </RowHead>
            <Cell className="max-md:hidden">
              {section.ownerName}’s version {section.versionNumber}
            </Cell>
            {section.effect ? (
              <>
                <Cell align="right">{section.students}</Cell>
                <Cell align="right">{tenths(section.effect.meanNow)}</Cell>
                <Cell align="right">{tenths(section.effect.meanThen)}</Cell>
                <Cell align="right" className="text-heading">
                  {signedTenths(section.effect.change)}
                </Cell>
              </>
            ) : (
              <Cell colSpan={4} align="right">
                {section.students === 1 ? '1 student' : `${section.students} students`}: too few to show
              </Cell>
            )}
          </tr>
        ))}
      </TableBody>
    </Table>
  );
}

function Spread({ sections }: { sections: SectionEffect[] }) {
  const told = sections.flatMap(({ effect, ...section }) => (effect ? [{ ...section, effect }] : []));
  const moving = told.filter(({ effect }) => effect.changes.some((change) => change !== 0));
  if (moving.length === 0) return null;
  const scale = changeScale(moving.map(({ effect }) => effect.changes));
  return (
    <div>
      <h3 className="text-lead font-[640]">How far students would move</h3>
      <p className="text-label text-ink-2">
        A square for each who moves: left of 0 loses, right of it gains.
        {moving.length < told.length ? ' In sections not drawn here nobody moves.' : ''}
      </p>
      <ul className="mt-4 grid gap-x-8 gap-y-6 sm:grid-cols-2 xl:grid-cols-3">
        {moving.map(({ sittingId, period, sectionName, effect }) => (
          <li key={sittingId}>
            <p className="mb-2 text-label font-[580] first-letter:uppercase">
              {sayPeriod(period)}, {sectionName}
            </p>
            <Picture changes={effect.changes} scale={scale} label={sayPeriod(period)} />
          </li>
        ))}
      </ul>
    </div>
  );
}

function Picture({ changes, scale, label }: { changes: number[]; scale: ChangeScale; label: string }) {
  const moving = changes.filter((change) => change !== 0);
  const gain = moving.filter((change) => change > 0).length;
  return (
    <>
      <SquareHistogram
        kind="full"
        values={moving.map((change) => change / 100)}
        {...scale}
        label={`${label}, change of each student who moves`}
      />
      <p className="mt-1 text-label">
        {moving.length - gain} lose, {changes.length - moving.length} stay, {gain} gain
      </p>
    </>
  );
}
