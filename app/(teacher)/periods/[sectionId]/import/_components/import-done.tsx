import { Button } from '@/components/ui/button';
import { LinkButton } from '@/components/ui/link-button';
import { Verdict } from '@/components/ui/titles';
import type { ImportedView } from '@/lib/data/sections/import-roster';
import { count, sayUnchanged } from './row-groups';

interface ImportDoneProps {
  sectionId: string;
  imported: ImportedView;
  startOver: () => void;
}

/** What an import did, and what comes next. */
export function ImportDone({ sectionId, imported, startOver }: ImportDoneProps) {
  const comes = imported.added + imported.enrolled;
  return (
    <div className="grid gap-6">
      <Verdict role="status">{sayImported(imported)}</Verdict>
      {comes > 0 ? (
        <p className="max-w-[56ch]">
          To sign in, each new student needs a slip with four words. Print them now, or when you need them.
        </p>
      ) : null}
      <div className="flex flex-wrap gap-2">
        {comes > 0 ? (
          <LinkButton kind="act" href={`/periods/${sectionId}/slips`}>
            make slips
          </LinkButton>
        ) : null}
        <LinkButton href="/practicals">practicals</LinkButton>
        <Button onClick={startOver}>more names</Button>
      </div>
    </div>
  );
}

function sayImported(imported: ImportedView): string {
  const { changed, added, enrolled, renamed, renumbered, unchanged, leftOut } = imported;
  if (!changed && leftOut === 0) return sayUnchanged(unchanged);
  const parts = [
    changed ? null : 'Nothing changed.',
    added > 0 ? count(added, 'One student is new.', 'students are new.') : null,
    enrolled > 0 ? count(enrolled, 'One joins from the school.', 'join from the school.') : null,
    renamed > 0 ? count(renamed, 'One name was corrected.', 'names were corrected.') : null,
    renumbered > 0 ? count(renumbered, 'One ID was changed.', 'IDs were changed.') : null,
    unchanged > 0 ? count(unchanged, 'One was here already.', 'were here already.') : null,
    leftOut > 0 ? count(leftOut, 'One row was left out.', 'rows were left out.') : null,
  ];
  return parts.filter(Boolean).join(' ');
}
