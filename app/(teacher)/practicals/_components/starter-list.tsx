import { Heading } from '@/components/ui/titles';
import { listStarters } from '@/lib/practicals/starters';
import { copyStarterAction } from '../actions';
import { PressForm } from './press-form';
import { sayPieces } from './say-pieces';
import { StarterDrawing } from './starter-drawing';

/** The six practicals that come with the product, each to be copied and made one’s own. */
export function StarterList({ heading }: { heading: string }) {
  return (
    <section aria-labelledby="starters-heading">
      <Heading id="starters-heading">{heading}</Heading>
      <ul className="mt-3 grid gap-x-8 sm:grid-cols-2 xl:grid-cols-3">
        {listStarters().map(({ id, title, unit, about, blank, lines, pieces }) => (
          <li key={id} className="grid grid-cols-[9rem_minmax(0,1fr)] gap-4 border-t border-hair py-4">
            <StarterDrawing starter={id} />
            <div className="grid content-start gap-2">
              <h3 className="font-title text-[1.25rem] leading-6 font-[620]">{title}</h3>
              <p>{about}</p>
              <p className="text-label text-ink-2">
                {blank} {unit === 'in' ? 'in' : 'mm'}; {sayPieces(lines, pieces)}
              </p>
              <PressForm
                action={copyStarterAction}
                fields={{ starter: id }}
                label="copy it"
                fullLabel={`copy the starter ${title}`}
              />
            </div>
          </li>
        ))}
      </ul>
    </section>
  );
}
