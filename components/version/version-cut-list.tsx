import { OtherLength, OtherUnitProvider, OtherUnitSwitch } from '@/components/other-unit/other-unit';
import { readOtherUnit } from '@/components/other-unit/read-other-unit';
import { PartDrawing } from '@/components/part/part-drawing';
import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import { LengthText } from '@/components/ui/fraction';
import { pointsAsText } from '@/components/ui/points-text';
import { Heading } from '@/components/ui/titles';
import type { Task } from '@/lib/practicals/task';
import { AXES, type Line, type Rubric } from '@/lib/scoring';

interface VersionCutListProps {
  task: Task;
  rubric: Rubric;
}

/** Every part with its sizes and what it is worth, then each as a drawing. */
export async function VersionCutList({ task, rubric }: VersionCutListProps) {
  const { unit, lineNotes } = task;
  return (
    <OtherUnitProvider isOn={await readOtherUnit()}>
      <section aria-labelledby="cut-list-heading">
        <div className="flex flex-wrap items-baseline justify-between gap-x-8">
          <Heading id="cut-list-heading">Cut list</Heading>
          <OtherUnitSwitch unit={unit} className="print:hidden" />
        </div>
        <Table caption="cut list" className="mt-1">
          <TableHead>
            <tr>
              <HeadCell className="w-8">
                <span className="sr-only">line</span>
              </HeadCell>
              <HeadCell>part</HeadCell>
              <HeadCell align="right">pieces</HeadCell>
              {AXES.map((axis) => (
                <HeadCell key={axis} align="right">
                  {axis}
                  {unit === 'mm' ? ', mm' : ''}
                </HeadCell>
              ))}
              <HeadCell align="right">worth</HeadCell>
              <HeadCell align="right">missing</HeadCell>
              <HeadCell className="min-w-40 pl-6">checks</HeadCell>
            </tr>
          </TableHead>
          <TableBody fives>
            {rubric.lines.map((line, index) => (
              <tr key={line.id}>
                <Cell className="text-label text-ink-2">{index + 1}</Cell>
                <RowHead className="min-w-28">
                  {line.label}
                  {lineNotes[line.id] ? (
                    <span className="block max-w-[36ch] text-label font-[440] text-ink-2">
                      {lineNotes[line.id]}
                    </span>
                  ) : null}
                </RowHead>
                <Cell align="right">{line.quantity}</Cell>
                {AXES.map((axis) => (
                  <Cell key={axis} align="right">
                    <LengthText ticks={line.target[axis]} unit={unit} />
                    <OtherLength ticks={line.target[axis]} unit={unit} className="block text-small" />
                  </Cell>
                ))}
                <Cell align="right">{pointsAsText(line.worth)}</Cell>
                <Cell align="right">{pointsAsText(line.missing)}</Cell>
                <Cell className="pl-6 text-label">{checkWords(line)}</Cell>
              </tr>
            ))}
          </TableBody>
        </Table>
        <ul className="mt-5 grid grid-cols-2 sm:grid-cols-[repeat(auto-fill,minmax(11.5rem,1fr))] gap-x-6 gap-y-5">
          {rubric.lines.map((line) => (
            <li key={line.id} className="break-inside-avoid">
              <PartDrawing size={line.target} unit={unit} label={line.label} width={310} height={190} />
              <p className="border-t border-hair pt-1 text-label">
                {line.label}
                {line.quantity > 1 ? <span className="text-ink-2"> × {line.quantity}</span> : null}
              </p>
            </li>
          ))}
        </ul>
      </section>
    </OtherUnitProvider>
  );
}

/** "square 1, surface 1": each check with the most it can cost. */
function checkWords({ checks }: Line): string {
  if (checks.length === 0) return 'none';
  return checks
    .map(({ label, levels }) => `${label} ${pointsAsText(Math.max(...levels.map(({ lose }) => lose)))}`)
    .join(', ');
}
