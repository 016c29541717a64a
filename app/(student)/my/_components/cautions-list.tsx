import { HazardSign } from '@/components/ui/refusal';
import { CAUTION_PREFACE, CAUTIONS } from '@/lib/practicals/cautions';

/** The usual cautions, said before anything about cutting, with what comes before them. */
export function CautionsList() {
  return (
    <section aria-labelledby="cautions" className="border-l-edge border-refuse pl-4">
      <h2 id="cautions" className="text-heading text-refuse">
        <HazardSign className="mr-2" />
        Before you cut
      </h2>
      <p className="mt-1 font-[580]">{CAUTION_PREFACE}</p>
      <ul className="mt-2 grid gap-1.5">
        {CAUTIONS.map((caution) => (
          <li
            key={caution}
            className="relative pl-4 before:absolute before:top-[0.6em] before:left-0 before:w-2 before:border-t-outline before:border-refuse"
          >
            {caution}
          </li>
        ))}
      </ul>
    </section>
  );
}
