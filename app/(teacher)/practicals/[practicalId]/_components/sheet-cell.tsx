'use client';

import { textAt, typeAt } from '@/lib/practicals/draft-paths';
import { CellInput } from './cell-input';
import { useEditor } from './editor-context';

interface SheetCellProps {
  path: string;
  label: string;
  placeholder?: string;
}

/** A cell outside the lines: it types into a path of the draft by itself. */
export function SheetCell({ path, label, placeholder }: SheetCellProps) {
  const { desk, errorsAt, findings, focused, setFocused } = useEditor();
  return (
    <CellInput
      {...{ path, label, placeholder }}
      text={textAt(desk.draft, path)}
      inHand={focused === path}
      refused={errorsAt(path).length > 0}
      found={findings.some((each) => each.path === path)}
      onType={(text) => desk.edit((draft) => typeAt(draft, path, text))}
      onFocus={() => setFocused(path)}
      onBlur={() => setFocused(null)}
    />
  );
}
