'use client';

import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import { pointsAsText } from '@/components/ui/points-text';
import { Heading } from '@/components/ui/titles';
import type { AccommodationDeskView } from '@/lib/data/accommodations/read-accommodation-desk';
import { type Effect, effectsOf } from './effect';
import type { Typed } from './use-typed';

interface ScoresAsideProps {
  desk: AccommodationDeskView;
  typed: Typed;
  student: { givenName: string; familyName: string } | undefined;
}

/** What is recorded of the student, as everybody is priced and modified. */
export function ScoresAside({ desk, typed, student }: ScoresAsideProps) {
  return (
    <section>
      <Heading>What it gives</Heading>
      <Scores desk={desk} typed={typed} student={student} />
    </section>
  );
}

function Scores({ desk, typed, student }: ScoresAsideProps) {
  if (!student) return <Quiet>Choose a student to see the scores of what is recorded.</Quiet>;
  const name = `${student.givenName} ${student.familyName}`.trim();
  const { modification } = typed;
  if (!modification) return <Quiet>The scores stand here once everything can be read.</Quiet>;
  const own = typed.sittingId === null ? desk.standing.map(({ sittingId }) => sittingId) : [];
  const effects = effectsOf(
    typed.sittings,
    modification,
    own.filter((id) => id !== null),
  );
  if (effects.length === 0) {
    return (
      <Quiet>
        Nothing is recorded of {name} {typed.sittingId === null ? 'this term' : 'in this sitting'} yet. What
        will be is priced by it.
      </Quiet>
    );
  }
  return (
    <>
      <p className="mb-2 text-label text-ink-2">{name}, without the bonus of a prediction</p>
      <Table caption={`scores of ${name}`}>
        <TableHead>
          <tr>
            <HeadCell>recorded</HeadCell>
            <HeadCell align="right">as everybody</HeadCell>
            <HeadCell align="right">modified</HeadCell>
          </tr>
        </TableHead>
        <TableBody>
          {effects.map((effect) => (
            <EffectRow key={effect.key} effect={effect} />
          ))}
        </TableBody>
      </Table>
      <p className="mt-3 text-label">
        Results that are out stay as they are. The sitting’s publish page shows what differs.
      </p>
    </>
  );
}

function EffectRow({ effect }: { effect: Effect }) {
  const { title, attemptNumber, complete, before, after, ownStands } = effect;
  const notes = [
    attemptNumber > 1 ? `attempt ${attemptNumber}` : null,
    complete ? null : 'so far',
    ownStands ? 'keeps its own modified rubric' : null,
  ].filter((note) => note !== null);
  const text = (points: number | null) => (points === null ? 'no number' : pointsAsText(points));
  return (
    <tr>
      <RowHead className="font-[480]">
        {title}
        {notes.length > 0 ? <span className="block text-label text-ink-2">{notes.join(', ')}</span> : null}
      </RowHead>
      <Cell align="right">{text(before)}</Cell>
      <Cell align="right" className={before === after || ownStands ? 'font-[660]' : 'font-[660] text-act'}>
        {ownStands ? '' : text(after)}
      </Cell>
    </tr>
  );
}

function Quiet({ children }: { children: React.ReactNode }) {
  return <p className="mt-1 text-label text-ink-2">{children}</p>;
}
