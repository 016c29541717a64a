import { LinkButton } from '@/components/ui/link-button';
import { Heading } from '@/components/ui/titles';
import type { SchoolView } from '@/lib/data/school/read-school';

interface Step {
  key: string;
  say: string;
  href: string;
  label: string;
}

/** What the school still lacks, in the order in which it is needed. */
export function stepsFor(school: SchoolView): Step[] {
  const steps: Step[] = [];
  if (!school.currentTerm) {
    steps.push({
      key: 'term',
      say: 'No term holds today. Sections belong to a term.',
      href: '/school/terms',
      label: 'add a term',
    });
  }
  if (school.teacherCount === 0) {
    steps.push({
      key: 'teacher',
      say: 'Nobody teaches here yet.',
      href: '/school/people/invite',
      label: 'invite a teacher',
    });
  }
  if (school.waitingCount > 0) {
    const many = school.waitingCount === 1 ? 'One person has' : `${school.waitingCount} people have`;
    steps.push({
      key: 'waiting',
      say: `${many} not taken up the invitation yet. A link lives for seven days.`,
      href: '/school/people',
      label: 'see who',
    });
  }
  if (school.teacherCount > 0 && school.sectionCount === 0) {
    steps.push({
      key: 'section',
      say: 'No sections yet. Each teacher makes their own under “periods”, and brings in the roster.',
      href: '/school/people',
      label: 'see the teachers',
    });
  }
  return steps;
}

export function NextSteps({ school }: { school: SchoolView }) {
  const steps = stepsFor(school);
  if (steps.length === 0) return null;
  return (
    <section className="mb-8">
      <Heading className="mb-1 border-b border-ink pb-1">next</Heading>
      <ul>
        {steps.map(({ key, say, href, label }) => (
          <li key={key} className="flex flex-wrap items-center gap-x-4 gap-y-2 border-b border-hair py-2">
            <span className="min-w-0 flex-1 basis-64">{say}</span>
            <LinkButton href={href} size="small">
              {label}
            </LinkButton>
          </li>
        ))}
      </ul>
    </section>
  );
}
