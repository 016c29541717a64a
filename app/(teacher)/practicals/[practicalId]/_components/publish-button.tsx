'use client';

import { useRouter } from 'next/navigation';
import { useState, useTransition } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { LinkButton } from '@/components/ui/link-button';
import { PhraseText } from '@/components/ui/phrase-text';
import { Refusal } from '@/components/ui/refusal';
import { changesSince } from '@/lib/practicals/changes-since';
import type { ParsedDraft } from '@/lib/practicals/parse-draft';
import { sameInEffect } from '@/lib/practicals/same-in-effect';
import { publishVersionAction } from '../actions';
import type { Editor } from './editor-context';
import type { DraftDesk } from './use-draft';

interface PublishButtonProps {
  practicalId: string;
  desk: DraftDesk;
  parsed: ParsedDraft;
  latest: Editor['latest'];
  /** Called when fields cannot be used yet: shows them all and goes to the first. */
  onBadFields(): void;
}

type Good = Extract<ParsedDraft, { ok: true }>;

/** Publishing: keeps what is typed, says that a version never changes and what this one changes, then makes it. */
export function PublishButton({ practicalId, desk, parsed, latest, onBadFields }: PublishButtonProps) {
  const [asking, setAsking] = useState<number | null>(null);
  const [published, setPublished] = useState<number | null>(null);
  const number = (latest?.number ?? 0) + 1;
  const unchanged = parsed.ok && latest !== null && sameInEffect(latest, parsed);

  async function ask() {
    if (!parsed.ok) {
      onBadFields();
      return;
    }
    setAsking(await desk.keepNow());
  }

  return (
    <>
      <Button
        kind="act"
        notYet={unchanged ? `nothing has changed since version ${latest?.number}` : null}
        onClick={() => void ask()}
      >
        publish version {number}
      </Button>
      {parsed.ok && asking !== null ? (
        <Ask
          {...{ practicalId, number, parsed, latest }}
          revision={asking}
          onClose={() => setAsking(null)}
          onPublished={(made) => {
            setAsking(null);
            setPublished(made);
          }}
        />
      ) : null}
      {published === null ? null : (
        <Published practicalId={practicalId} number={published} onClose={() => setPublished(null)} />
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
  onClose(): void;
  onPublished(number: number): void;
}

function Ask({ practicalId, number, revision, parsed, latest, onClose, onPublished }: AskProps) {
  const router = useRouter();
  const [pending, start] = useTransition();
  const [refused, setRefused] = useState<string | null>(null);

  function publish() {
    start(async () => {
      const reply = await publishVersionAction(practicalId, revision).catch(() => null);
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
          <ul className="mt-1 list-disc pl-5">
            {changesSince(latest, parsed).map((phrase) => (
              <li key={JSON.stringify(phrase)} className="first-letter:uppercase">
                <PhraseText phrase={phrase} unit={parsed.task.unit} />
              </li>
            ))}
          </ul>
        </div>
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

function Published({
  practicalId,
  number,
  onClose,
}: {
  practicalId: string;
  number: number;
  onClose(): void;
}) {
  return (
    <Dialog
      open
      onOpenChange={(open) => {
        if (!open) onClose();
      }}
      title={`Version ${number} is published`}
      description="Give it to a section, or try it at the bench first: a practice round keeps nothing."
    >
      <div className="flex flex-wrap gap-2">
        <LinkButton kind="act" href={`/sittings/new?practical=${practicalId}`}>
          open a sitting
        </LinkButton>
        <LinkButton href={`/practicals/${practicalId}/practice`}>practice round</LinkButton>
        <Button kind="quiet" onClick={onClose}>
          stay here
        </Button>
      </div>
    </Dialog>
  );
}
