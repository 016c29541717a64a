'use client';

import { useState } from 'react';
import { typeAt } from '@/lib/practicals/draft-paths';
import { useEditor } from './editor-context';
import { SheetDesk, type SheetSaid } from './sheet-desk';
import { SheetKeys } from './sheet-keys';

/** The cut list as a sheet: what changes its lines, its keys, and what was done last. The first two never change. */
export function useSheet() {
  const { desk, unit, judge } = useEditor();
  const [said, show] = useState<SheetSaid>({ text: '', canUndo: false });
  const [verbs] = useState(() => {
    const made = new SheetDesk({ unit, now: desk.now, edit: desk.edit, judge, show });
    const type = (path: string, text: string) => desk.edit((draft) => typeAt(draft, path, text));
    const keys = new SheetKeys(made, (row, column, text) => type(`lines.${row}.${column}`, text));
    return { sheet: made, keys, type };
  });
  return { ...verbs, said };
}
