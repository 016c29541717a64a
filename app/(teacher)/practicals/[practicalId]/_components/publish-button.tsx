'use client';

import { useRouter } from 'next/navigation';
import { useRef, useState, useTransition } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { PhraseList } from '@/components/ui/phrase-list';
import { Refusal } from '@/components/ui/refusal';
import type { DepartmentRubric } from '@/lib/data/practicals/department-rubric';
import type { SittingBehind } from '@/lib/data/practicals/read-practical';
import { changesSince } from '@/lib/practicals/changes-since';
import { type ParsedDraft, parseDraft } from '@/lib/practicals/parse-draft';
import { sameInEffect } from '@/lib/practicals/same-in-effect';
import { publishVersionAction } from '../actions';
import { DepartmentPart } from './department-part';
import type { Editor } from './editor-context';
import { Published } from './published';
import type { DraftDesk } from './use-draft';

interface PublishButtonProps {
  practicalId: string;
  desk: DraftDesk;
  parsed: ParsedDraft;
  latest: Editor['latest'];
  department: DepartmentRubric | null;
  behind: readonly SittingBehind[];
  /** Called when fields cannot be used yet: shows them all and goes to the first. */
  onBadFields(): void;
}

type Good = Extract<ParsedDraft, { ok: true }>;

/** Publishing: keeps what is typed, says that a version never changes and what this one changes, then makes it. */
export function PublishButton(props: PublishButtonProps) {
  const { practicalId, desk, parsed, latest, department, behind, onBadFields } = props;
  const [asking, setAsking] = useState<number | null>(null);
  const [published, setPublished] = useState<number | null>(null);
  const button = useRef<HTMLButtonElement>(null);
  const number = (latest?.number ?? 0) + 1;
  const unchanged = parsed.ok && latest !== null && sameInEffect(latest, parsed);

  async function ask() {
    if (!parseDraft(desk.now()).ok) {
      onBadFields();
      return;
    }
    setAsking(await desk.keepNow());
  }

  return (
    <>
      <Button
        ref={button}
        kind="act"
        notYet={unchanged ? `nothing has changed since version ${latest?.number}` : null}
        onClick={() => void ask()}
      >
        publish version {number}
      </Button>
      {parsed.ok && asking !== null ? (
        <Ask
          {...{ practicalId, number, parsed, latest, department }}
          revision={asking}
          onClose={() => setAsking(null)}
          onPublished={(made) => {
            setAsking(null);
            setPublished(made);
          }}
        />
      ) : null}
      {published === null ? null : (
        <Published
          {...{ practicalId, behind }}
          number={published}
          returnTo={button}
          onClose={() => setPublished(null)}
        />
      )}
    </>
  );
}

interface AskProps {
  practicalId: string;
  number: number;
  revision: number;
  parsed: Good;
  latest: Editor['latest'];
  department: DepartmentRubric | null;
  onClose(): void;
  onPublished(number: number): void;
}

function Ask(props: AskProps) {
  const { practicalId, number, revision, parsed, latest, department, onClose, onPublished } = props;
  const reason = useRef<HTMLTextAreaElement>(null);
  const router = useRouter();
  const [pending, start] = useTransition();
  const [refused, setRefused] = useState<string | null>(null);

  function publish() {
    start(async () => {
      const reply = await publishVersionAction(practicalId, revision, reason.current?.value ?? null).catch(
        () => null,
      );
      if (reply?.kind === 'published') {
        router.refresh();
        onPublished(reply.number);
        return;
      }
      setRefused(
        reply?.message ?? 'The server does not answer. Nothing was published; try again in a moment.',
      );
    });
  }

  return (
    <Dialog
      open
      onOpenChange={(open) => {
        if (!open) onClose();
      }}
      title={`Publish version ${number}?`}
      description="A version never changes. A sitting keeps the one it was opened with; what you change afterwards becomes the next version."
      closeLabel="not yet"
    >
      {latest ? (
        <div className="mb-4">
          <h3 className="font-[640]">What changes since version {latest.number}</h3>
          <PhraseList phrases={changesSince(latest, parsed)} unit={parsed.task.unit} className="mt-1" />
        </div>
      ) : null}
      {department ? (
        <DepartmentPart
          {...{ department, parsed }}
          given={latest?.differenceReason ?? ''}
          reasonField={reason}
        />
      ) : null}
      {refused ? <Refusal title={refused} className="mb-4" /> : null}
      <div className="flex flex-wrap justify-end gap-2">
        <Button onClick={onClose}>not yet</Button>
        <Button kind="act" onClick={publish} disabled={pending} aria-busy={pending}>
          {pending ? 'publishing …' : `publish version ${number}`}
        </Button>
      </div>
    </Dialog>
  );
}
