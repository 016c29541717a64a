'use client';

import { useRouter } from 'next/navigation';
import { type RefObject, useRef, useState, useTransition } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { LinkButton } from '@/components/ui/link-button';
import { PhraseList } from '@/components/ui/phrase-list';
import { Refusal } from '@/components/ui/refusal';
import { TextAreaField } from '@/components/ui/text-area-field';
import { LONGEST_REASON } from '@/lib/contracts/practicals';
import type { DepartmentRubric } from '@/lib/data/practicals/department-rubric';
import { changesSince } from '@/lib/practicals/changes-since';
import { departmentDifferences } from '@/lib/practicals/department-differences';
import { type ParsedDraft, parseDraft } from '@/lib/practicals/parse-draft';
import { sameInEffect } from '@/lib/practicals/same-in-effect';
import { publishVersionAction } from '../actions';
import type { Editor } from './editor-context';
import type { DraftDesk } from './use-draft';

interface PublishButtonProps {
  practicalId: string;
  desk: DraftDesk;
  parsed: ParsedDraft;
  latest: Editor['latest'];
  department: DepartmentRubric | null;
  /** Called when fields cannot be used yet: shows them all and goes to the first. */
  onBadFields(): void;
}

type Good = Extract<ParsedDraft, { ok: true }>;

/** Publishing: keeps what is typed, says that a version never changes and what this one changes, then makes it. */
export function PublishButton(props: PublishButtonProps) {
  const { practicalId, desk, parsed, latest, department, onBadFields } = props;
  const [asking, setAsking] = useState<number | null>(null);
  const [published, setPublished] = useState<number | null>(null);
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

interface DepartmentPartProps {
  department: DepartmentRubric;
  parsed: Good;
  /** What was said of the version before. */
  given: string;
  reasonField: RefObject<HTMLTextAreaElement | null>;
}

/** Where the version differs from the department’s, and room to say why. It asks nothing of a version that does not. */
function DepartmentPart({ department, parsed, given, reasonField }: DepartmentPartProps) {
  const { same, sentences } = departmentDifferences(department, { ...parsed, label: 'this version' });
  if (same) return null;
  return (
    <div className="mb-4">
      <h3 className="font-[640]">Where it differs from the department’s rubric</h3>
      <PhraseList phrases={sentences} unit={parsed.task.unit} className="mt-1" />
      <TextAreaField
        ref={reasonField}
        label="why"
        optional
        hint="Your head reads the differences, and this beside them."
        rows={2}
        maxLength={LONGEST_REASON}
        defaultValue={given}
        className="mt-3"
      />
    </div>
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
