'use client';

import { useRef } from 'react';
import { Button } from '@/components/ui/button';
import { findPiece } from '@/lib/round/pieces';
import { fullName } from '@/lib/round/students';
import type { Parked } from '@/lib/sync/client/round-store';
import { useBench } from './bench-context';
import { BenchKey } from './bench-parts';
import { useUnsentFile } from './use-unsent-file';

/** What this tablet has kept, what the server has, what it refused, and the unsent readings as a file. */
export function KeptPanel() {
  const { view, session, open, practice } = useBench();
  const { counts, sending, parked, failure } = view;
  const waiting = counts.kept - counts.sent - parked.length;
  return (
    <section aria-label="kept and sent" className="flex min-h-0 flex-1 flex-col gap-4 overflow-y-auto py-3">
      <div className="flex items-start gap-3">
        <div className="flex-1">
          <h2 className="text-key">Kept on this tablet: {counts.kept}</h2>
          <p className="mt-1 max-w-[44rem] text-lead text-ink-2">
            {practice
              ? 'A practice round: nothing is stored or sent, and everything is gone when you leave it.'
              : waiting > 0
                ? `${counts.sent} have reached the server, ${waiting} wait here. ${waitingWords(sending)}`
                : 'All of them have reached the server.'}
          </p>
        </div>
        <BenchKey onPress={() => open(null)} className="min-w-28">
          close
        </BenchKey>
      </div>
      {failure ? (
        <div role="alert" className="border-l-edge border-refuse pl-3 text-lead text-refuse">
          <p>{failure}</p>
          <Button className="mt-2" onClick={session.forgetFailure}>
            I have seen it
          </Button>
        </div>
      ) : null}
      {parked.length > 0 ? <Refused parked={parked} /> : null}
      {practice ? null : <UnsentFile />}
    </section>
  );
}

function waitingWords(sending: ReturnType<typeof useBench>['view']['sending']): string {
  switch (sending.state) {
    case 'waiting':
      return `${sending.message} They are sent by themselves as soon as it can be done.`;
    case 'halted':
      return sending.message;
    default:
      return 'They are being sent.';
  }
}

function Refused({ parked }: { parked: readonly Parked[] }) {
  const { view, session } = useBench();
  const { students, rubric } = view.state.plan;
  return (
    <div>
      <h3 className="text-heading">Not taken by the server: {parked.length}</h3>
      <p className="mt-1 max-w-[44rem] text-text text-ink-2">
        They are still on this tablet and count for nothing until they are taken. Save them as a file before
        you let them go.
      </p>
      <ul className="mt-2">
        {parked.map(({ id, reason, event }) => {
          const student = students.find(({ attemptId }) => attemptId === event.attemptId);
          const place = findPiece(rubric, event.cell);
          return (
            <li key={id} className="border-b border-hair py-2">
              <span className="font-[620]">
                {student ? fullName(student) : 'a student who is not in this round'}, {place?.label ?? 'work'}
                , {event.cell.what.replace('@', '')}
                {event.typed ? `: ${event.typed}` : ''}
              </span>
              <span className="block text-ink-2">{reason}</span>
            </li>
          );
        })}
      </ul>
      <div className="mt-3 flex gap-2">
        <Button onClick={() => void session.retryParked()}>try them again</Button>
        <Button kind="refuse" onClick={() => void session.dropParked(parked.map(({ id }) => id))}>
          let them go
        </Button>
      </div>
    </div>
  );
}

function UnsentFile() {
  const input = useRef<HTMLInputElement>(null);
  const { save, takeIn, told } = useUnsentFile();
  return (
    <div>
      <h3 className="text-heading">Unsent readings as a file</h3>
      <p className="mt-1 max-w-[44rem] text-text text-ink-2">
        For a tablet that cannot reach the server. Taking the file in elsewhere, or twice, does no harm: each
        reading is known by its own number.
      </p>
      <div className="mt-3 flex flex-wrap gap-2">
        <Button onClick={() => void save()}>save the unsent readings</Button>
        <Button onClick={() => input.current?.click()}>take a file in</Button>
        <input
          ref={input}
          type="file"
          accept=".json,application/json"
          aria-label="file of unsent readings"
          className="sr-only"
          tabIndex={-1}
          onChange={(event) => {
            const [file] = event.target.files ?? [];
            event.target.value = '';
            if (file) void takeIn(file);
          }}
        />
      </div>
      <p role="status" className="mt-2 min-h-6 text-text">
        {told}
      </p>
    </div>
  );
}
