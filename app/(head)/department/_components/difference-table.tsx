import { classNames } from '@/components/ui/class-names';
import { LengthText } from '@/components/ui/fraction';
import { PhraseText } from '@/components/ui/phrase-text';
import { pointsAsText } from '@/components/ui/points-text';
import { Heading } from '@/components/ui/titles';
import type { VersionsComparison } from '@/lib/data/department/compare-versions';
import type { Unit } from '@/lib/length';
import type { ComparedRow, ComparedValue, Phrase } from '@/lib/practicals/compare-types';

interface Part {
  name: Phrase;
  rows: ComparedRow[];
}

/** Every difference with what each rubric says, and below it, folded, all that they say alike. */
export function DifferenceTable({ view }: { view: VersionsComparison }) {
  const { comparison } = view;
  const parts: Part[] = [
    ...comparison.sizes.map(({ name, rows }) => ({ name, rows })),
    { name: ['pieces'], rows: comparison.pieces },
    { name: ['total and reading'], rows: comparison.whole },
    { name: ['late, redo, prediction'], rows: comparison.policies },
  ];
  const only = (differs: boolean) =>
    parts
      .map((part) => ({ ...part, rows: part.rows.filter((row) => row.differs === differs) }))
      .filter(({ rows }) => rows.length > 0);
  const differing = only(true);
  return (
    <section aria-labelledby="differ-heading" className="min-w-0">
      <Heading id="differ-heading">Where they differ</Heading>
      {differing.length === 0 ? (
        <p className="mt-2">Nowhere: each row below says the same for all of them.</p>
      ) : (
        <RowTable parts={differing} view={view} caption="where the rubrics differ" />
      )}
      <details className="mt-6" open={differing.length === 0}>
        <summary className="cursor-pointer py-2 text-label font-[640]">where they say the same</summary>
        <RowTable parts={only(false)} view={view} caption="where the rubrics say the same" />
      </details>
    </section>
  );
}

function RowTable({ parts, view, caption }: { parts: Part[]; view: VersionsComparison; caption: string }) {
  return (
    <div className="overflow-x-auto">
      <table className="tnum mt-2 w-full max-w-[40rem] text-left">
        <caption className="sr-only">{caption}</caption>
        <thead className="border-b-outline border-ink">
          <tr className="text-small text-ink-2">
            <th scope="col" className="py-1.5 pr-3 font-[480]">
              <span className="sr-only">what</span>
            </th>
            {view.versions.map(({ versionId, label, note }) => (
              <th
                key={versionId}
                scope="col"
                className="px-1.5 py-1.5 text-right align-bottom font-[480] last:pr-0"
              >
                <span className="block font-[640] text-ink">{label}</span>
                {label.startsWith('version') ? null : note}
              </th>
            ))}
          </tr>
        </thead>
        {parts.map(({ name, rows }) => (
          <tbody key={JSON.stringify(name)} className="[&>tr]:border-b [&>tr]:border-hair">
            <tr>
              <th
                scope="rowgroup"
                colSpan={view.versions.length + 1}
                className="pt-4 pb-1 text-label font-[640] first-letter:uppercase"
              >
                <PhraseText phrase={name} unit={view.unit} />
              </th>
            </tr>
            {rows.map((row) => (
              <Row key={JSON.stringify(row.label)} row={row} unit={view.unit} />
            ))}
          </tbody>
        ))}
      </table>
    </div>
  );
}

function Row({ row, unit }: { row: ComparedRow; unit: Unit }) {
  const [first] = row.values;
  const ofFirst = JSON.stringify(first);
  return (
    <tr>
      <th scope="row" className="py-1.5 pr-3 align-baseline text-label font-[440]">
        <PhraseText phrase={row.label} unit={unit} />
      </th>
      {row.values.map((value, index) => (
        <td
          key={index.toString()}
          className={classNames(
            'px-1.5 py-1.5 text-right align-baseline last:pr-0',
            value.kind === 'text' && 'text-label',
            JSON.stringify(value) !== ofFirst && 'font-[660] text-act',
          )}
        >
          <Value value={value} unit={unit} />
        </td>
      ))}
    </tr>
  );
}

function Value({ value, unit }: { value: ComparedValue; unit: Unit }) {
  switch (value.kind) {
    case 'length':
      return <LengthText ticks={value.ticks} unit={unit} />;
    case 'points':
      return pointsAsText(value.points);
    case 'percent':
      return `${value.percent}%`;
    case 'text':
      return value.text;
    case 'none':
      return <span className="text-ink-2">none</span>;
  }
}
