import { Mark } from '@/components/shell/mark';
import { LinkButton } from '@/components/ui/link-button';
import { Heading } from '@/components/ui/titles';
import type { PracticalListItem } from '@/lib/data/practicals/list-practicals';
import type { SectionListView } from '@/lib/data/sections/list-sections';

interface FirstStepsProps {
  sections: readonly SectionListView[];
  practicals: readonly PracticalListItem[];
}

interface Step {
  title: string;
  say: string;
  done: boolean;
  href: string;
  label: string;
}

function stepsFor({ sections, practicals }: FirstStepsProps): Step[] {
  const empty = sections.find(({ studentCount }) => studentCount === 0);
  const hasStudents = sections.some(({ studentCount }) => studentCount > 0);
  const practical = practicals[0];
  return [
    {
      title: 'Make a period',
      say: 'A name and a number: Woods 2, period 3.',
      done: sections.length > 0,
      href: '/periods/new',
      label: 'make a period',
    },
    {
      title: 'Paste the names',
      say: 'One a line, or a CSV. Where there are no IDs, they are made.',
      done: hasStudents,
      href: empty ? `/periods/${empty.sectionId}/import` : '/periods/new',
      label: 'paste names',
    },
    {
      title: 'Copy a starter practical',
      say: 'Six stand ready, with cut list, blank and prices. The copy is yours to change.',
      done: practicals.length > 0,
      href: '/practicals',
      label: 'choose a starter',
    },
    {
      title: 'Try a practice round',
      say: 'The bench as it will be, with made-up students. What you record is thrown away.',
      done: false,
      href: practical ? `/practicals/${practical.practicalId}/practice` : '/practicals',
      label: 'practice round',
    },
  ];
}

/** The way from an empty desk to a marked period. A step that is done bears the mark; the next one has the button. */
export function FirstSteps(props: FirstStepsProps) {
  const steps = stepsFor(props);
  const next = steps.find(({ done }) => !done);
  return (
    <section className="mb-12 max-w-[48rem]">
      <Heading className="border-b-edge border-ink pb-2">
        {props.sections.length === 0
          ? 'No periods yet. Ten minutes to the first round'
          : 'to the first round'}
      </Heading>
      <ol>
        {steps.map((step, index) => (
          <li
            key={step.title}
            className="grid grid-cols-[3rem_minmax(0,1fr)] items-center gap-x-4 gap-y-2 border-b border-ink py-3 sm:grid-cols-[3rem_minmax(0,1fr)_auto]"
          >
            <StepSign number={index + 1} done={step.done} />
            <div>
              <h3 className="text-lead font-[620]">{step.title}</h3>
              <p className="text-ink-2">{step.say}</p>
            </div>
            {step === next ? (
              <LinkButton
                kind="act"
                href={step.href}
                className="max-sm:col-start-2 max-sm:justify-self-start"
              >
                {step.label}
              </LinkButton>
            ) : null}
          </li>
        ))}
      </ol>
    </section>
  );
}

/** The mark's foot stands on the line under its step. */
function StepSign({ number, done }: { number: number; done: boolean }) {
  if (!done)
    return (
      <span aria-hidden className="tnum font-title text-title">
        {number}
      </span>
    );
  return (
    <span className="relative block h-full">
      <Mark className="absolute -bottom-3 left-0 h-9 w-auto" />
      <span className="sr-only">done</span>
    </span>
  );
}
