import type { TitleBlockCell } from '@/components/shell/title-block';
import { sayDayOf } from '@/components/ui/days';
import type { GradebookView } from '@/lib/contracts/gradebook';
import { count, sayPeriod } from '../../../_components/names';

export function gradebookTitleBlock(book: GradebookView, late: boolean): TitleBlockCell[] {
  const { section, sittings, files, may, timeZone } = book;
  const published = sittings.flatMap(({ publication }) => publication ?? []);
  const latest = published.reduce<(typeof published)[number] | null>(
    (last, each) => (last && last.publishedAt > each.publishedAt ? last : each),
    null,
  );
  const changed = published.reduce((sum, { changedSince }) => sum + changedSince, 0);
  const [file] = files;
  const cells: TitleBlockCell[] = [
    { label: 'section', value: `${section.name}, ${sayPeriod(section.period)}` },
    {
      label: 'published',
      value: latest ? `${sayDayOf(latest.publishedAt, timeZone)}${nth(latest.number)}` : 'not yet',
    },
  ];
  if (may.export) {
    cells.push({
      label: 'sent to the registrar',
      value: file ? `${sayDayOf(file.sentAt, timeZone)}, ${count(file.rows, 'row', 'rows')}` : 'not yet',
    });
  }
  cells.push({ label: 'since then', value: sinceThen(latest !== null, changed, late) });
  return cells;
}

function sinceThen(isPublished: boolean, changed: number, late: boolean): string {
  if (late) return 'not known: no answer';
  if (!isPublished) return 'being recorded';
  return changed === 0 ? 'nothing changed' : `${count(changed, 'result', 'results')} changed`;
}

function nth(number: number): string {
  if (number === 1) return '';
  return number === 2 ? ', second time' : `, time ${number}`;
}
