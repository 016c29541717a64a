'use client';

import { useRouter } from 'next/navigation';
import { useActionState, useEffect, useRef } from 'react';
import { FormRefusal } from '@/components/account/form-refusal';
import { DeskPage } from '@/components/shell/desk-page';
import { keepTyped } from '@/components/ui/keep-typed';
import { LinkButton } from '@/components/ui/link-button';
import { Notice } from '@/components/ui/notice';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextAreaField } from '@/components/ui/text-area-field';
import { Heading } from '@/components/ui/titles';
import type { AccommodationDeskView } from '@/lib/data/accommodations/read-accommodation-desk';
import { saySection } from '../../../../_components/words';
import { makeAccommodationAction } from '../../actions';
import { BandsPart } from './bands-part';
import { ChecksPart } from './checks-part';
import { ExcusedPart } from './excused-part';
import { ScoresAside } from './scores-aside';
import { useTyped } from './use-typed';
import { WhoAndWhat } from './who-and-what';

/** Modifies the rubric for one student; what it does is drawn and reckoned as it is typed. */
export function ModifyDesk({ desk }: { desk: AccommodationDeskView }) {
  const router = useRouter();
  const [reply, action] = useActionState(makeAccommodationAction, undefined);
  const typed = useTyped(desk);
  const errors = reply?.error ?? {};
  const form = useRef<HTMLFormElement>(null);
  useEffect(() => {
    if (reply?.error) form.current?.querySelector<HTMLElement>('[aria-invalid="true"]')?.focus();
  }, [reply]);
  const list = `/periods/${desk.sectionId}/modified`;
  const student = desk.students.find(({ studentId }) => studentId === desk.chosen);
  const there = desk.change
    ? undefined
    : desk.standing.find(({ sittingId }) => sittingId === typed.sittingId);
  return (
    <DeskPage
      title={desk.change ? 'Change a modified rubric' : 'Modify a rubric'}
      note={saySection(desk)}
      actions={<LinkButton href={list}>modified rubrics</LinkButton>}
      aside={
        <div className="max-xl:hidden xl:sticky xl:top-6">
          <ScoresAside desk={desk} typed={typed} student={student} />
        </div>
      }
    >
      <form ref={form} action={action} onReset={keepTyped} className="grid gap-10">
        <FormRefusal errors={errors[''] ?? undefined} />
        <input type="hidden" name="sectionId" value={desk.sectionId} />
        <input type="hidden" name="replaces" value={desk.change?.accommodationId ?? ''} />
        <WhoAndWhat
          desk={desk}
          typed={typed}
          error={desk.chosen ? undefined : errors.studentId}
          onStudent={(studentId) => router.replace(`${list}/new?student=${studentId}`, { scroll: false })}
        />
        {there ? (
          <Notice
            title="There is one already."
            action={
              <LinkButton size="small" href={`${list}/new?change=${there.accommodationId}`}>
                change it
              </LinkButton>
            }
          >
            This student has a modified rubric for this.
          </Notice>
        ) : null}
        <BandsPart typed={typed} error={errors.widen} />
        <ExcusedPart typed={typed} error={errors.excused} />
        {typed.rows.length > 0 ? <ChecksPart typed={typed} errors={errors} /> : null}
        <div className="max-w-[44rem] xl:hidden">
          <ScoresAside desk={desk} typed={typed} student={student} />
        </div>
        <section>
          <Heading className="mb-2">Reason</Heading>
          <TextAreaField
            label="why it is modified"
            name="reason"
            className="max-w-[44rem]"
            maxLength={2000}
            hint={
              desk.change
                ? 'Kept apart from scores; each look at it is logged. The reason of the one you change stays with that one.'
                : 'Kept apart from scores, for you and the head of your department; each look at it is logged.'
            }
            error={errors.reason}
          />
        </section>
        <div className="flex flex-wrap gap-2">
          <SubmitButton pendingLabel="keeping">
            {desk.change ? 'keep the change' : 'modify the rubric'}
          </SubmitButton>
          <LinkButton href={list}>leave it</LinkButton>
        </div>
      </form>
    </DeskPage>
  );
}
