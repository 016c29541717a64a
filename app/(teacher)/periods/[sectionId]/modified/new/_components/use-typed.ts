'use client';

import { useMemo, useState } from 'react';
import {
  asTypedChecks,
  excusedKey,
  modificationForm,
  type TypedModification,
} from '@/lib/contracts/accommodations';
import type { AccommodationDeskView } from '@/lib/data/accommodations/read-accommodation-desk';
import { isSameLabel } from '@/lib/scoring/modification';
import { formatFactor } from '@/lib/scoring/modification-factor';
import { type CheckRow, checkRows, typedChecks } from './check-rows';

type TypedCheck = TypedModification['checks'][number];

/** What stands in the form, and what it comes to as far as it can be read. */
export function useTyped(desk: AccommodationDeskView) {
  const was = desk.change?.modification;
  const [sittingId, setSittingId] = useState<string | null>(
    desk.change ? desk.change.sittingId : (desk.sittings[0]?.sittingId ?? null),
  );
  const [widen, setWiden] = useState(was ? formatFactor(was.widen) : '1');
  const [excused, setExcused] = useState<string[]>(
    was ? was.excused.map(({ lineId, axis }) => excusedKey(lineId, axis)) : [],
  );
  const [checks, setChecks] = useState<TypedCheck[]>(was ? asTypedChecks(was.checks) : []);

  const sittings = useMemo(
    () => desk.sittings.filter((each) => sittingId === null || each.sittingId === sittingId),
    [desk.sittings, sittingId],
  );
  const rows: CheckRow[] = useMemo(
    () => checkRows(sittings, sittingId === null ? checks : []),
    [sittings, sittingId, checks],
  );
  const typed: TypedModification = {
    widen,
    excused: excused.filter((key) => sittingId !== null || key.startsWith('*/')),
    checks: typedChecks(rows, checks),
  };
  const read = modificationForm.safeParse(typed);
  return {
    ...{ sittingId, setSittingId, sittings, rows, typed, setWiden },
    toggle: (key: string) =>
      setExcused((before) =>
        before.includes(key) ? before.filter((each) => each !== key) : [...before, key],
      ),
    setCheck: (check: TypedCheck) =>
      setChecks((before) => [...before.filter(({ label }) => !isSameLabel(label, check.label)), check]),
    modification: read.success ? read.data : null,
    factorError: read.success
      ? undefined
      : read.error.issues.find(({ path }) => path[0] === 'widen')?.message,
  };
}

export type Typed = ReturnType<typeof useTyped>;
