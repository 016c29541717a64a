'use client';

import { LengthText } from '@/components/ui/fraction';
import { shopInstruments, WORK_SPREAD } from '@/lib/practicals/shop-instruments';
import { useEditor } from './editor-context';

/** How "priced dearer by the instrument" is reckoned, and what is assumed of the instruments. */
export function InstrumentNote() {
  const { unit } = useEditor();
  const [rule, caliper] = shopInstruments(unit);
  if (!rule || !caliper) return null;
  return (
    <div className="max-w-[60ch] text-label text-ink-2">
      <p className="font-[640] text-ink">Priced dearer by the instrument</p>
      <p className="mt-1">
        Of the parts that truly lie within a band, so many read past its edge and its reading margin, and are
        priced in the next band, because no instrument reads exactly. Reckoned by the normal model of JCGM
        106: parts spread about the target by <LengthText ticks={WORK_SPREAD} unit="mm" withUnit />
        {unit === 'in' ? (
          <>
            , about <LengthText ticks={WORK_SPREAD} unit="in" decimals={3} withUnit />
          </>
        ) : null}{' '}
        (one standard deviation, common in a school shop), readings about the part by the standard uncertainty
        of the instrument.
      </p>
      <p className="mt-1">
        Rule: read to the nearest <LengthText ticks={rule.graduation} unit={unit} withUnit />. Caliper: read
        to <LengthText ticks={caliper.graduation} unit={unit} withUnit />
        {caliper.limit === null ? null : (
          <>
            , true within ±
            <LengthText ticks={caliper.limit} unit={unit} withUnit />
          </>
        )}
        . A reading margin makes it rarer.
      </p>
    </div>
  );
}
