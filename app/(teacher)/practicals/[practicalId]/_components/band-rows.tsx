'use client';

import { Button } from '@/components/ui/button';
import { classNames } from '@/components/ui/class-names';
import { LengthText } from '@/components/ui/fraction';
import { pointsAsText } from '@/components/ui/points-text';
import { parseLength } from '@/lib/length';
import {
  type BandChance,
  bandChances,
  chanceInShort,
  isLarge,
  sayChance,
} from '@/lib/practicals/band-chances';
import { addEdge, middleOfBand, sideOfRule, takeOutBand } from '@/lib/practicals/band-edges';
import { ruleScaleOf } from '@/lib/practicals/rule-scale-of';
import { shopInstruments } from '@/lib/practicals/shop-instruments';
import type { Axis, SizeRule } from '@/lib/scoring';
import { BandField } from './band-field';
import { useEditor } from './editor-context';
import { marginOf } from './read-draft';
import type { SizeRuleDesk } from './use-size-rule';

const MOST_BANDS = 20;

interface BandRowsProps {
  size: SizeRuleDesk;
  side: 'over' | 'under';
  title: string;
  axis: Axis;
  read: SizeRule | null;
}

const ROW =
  'grid grid-cols-[minmax(0,1fr)_minmax(0,1fr)_5.5rem] items-start gap-x-3 @min-[28rem]:grid-cols-[minmax(0,5fr)_minmax(0,4fr)_5.25rem_5.25rem_5.5rem]';
const CHANCE = 'hidden pt-2 text-right text-label whitespace-nowrap @min-[28rem]:block';

/** One side's bands, a row each. */
export function BandRows({ size, side, title, axis, read }: BandRowsProps) {
  const { desk, unit } = useEditor();
  const { bands } = size.rule[side];
  const name = `${side}, ${axis}`;
  const readTo = parseLength(desk.draft.reading.readTo, unit);
  const reading = {
    unit,
    margin: marginOf(desk.draft),
    readTo: readTo.ok && readTo.ticks > 0 ? readTo.ticks : null,
  };
  const chances = read ? bandChances(read, reading).filter((each) => each.side === side) : [];
  const instruments = shopInstruments(unit);
  return (
    <fieldset className="@container min-w-0">
      <legend className="text-label font-[640]">{title}</legend>
      <div
        className={classNames(ROW, 'mt-1 items-end border-b border-ink pb-1 text-small leading-4 text-ink-2')}
      >
        <span>within</span>
        <span>loses</span>
        {instruments.map(({ id, label }) => (
          <span key={id} className="hidden text-right @min-[28rem]:block">
            priced dearer by the {label}
          </span>
        ))}
        <span />
      </div>
      {[...bands.keys()].map((index) => (
        <BandRow key={index} {...{ size, side, index, name, read }} chance={chances[index] ?? null} />
      ))}
      <div className={classNames(ROW, 'border-b border-hair py-1')}>
        <span className="pt-2 text-label">{size.isOwn ? 'past the last band' : 'past it'}</span>
        {size.isOwn ? (
          <BandField size={size} suffix={`${side}.beyond`} label={`${name}, past the last band, points`} />
        ) : (
          <span className="pt-2">{size.rule[side].beyond}</span>
        )}
      </div>
      {size.isOwn && bands.length < MOST_BANDS ? <AddKey {...{ size, side, read }} /> : null}
    </fieldset>
  );
}

interface BandRowProps extends Omit<BandRowsProps, 'title' | 'axis'> {
  index: number;
  name: string;
  chance: BandChance | null;
}

function BandRow({ size, side, index, name, read, chance }: BandRowProps) {
  const { unit } = useEditor();
  const at = `${side}.bands.${index}`;
  const band = `${name}, band ${index + 1}`;
  const typed = size.rule[side].bands[index];
  const found = read?.[side][index];
  return (
    <div className={classNames(ROW, 'border-b border-hair py-1')}>
      {size.isOwn ? (
        <BandField size={size} suffix={`${at}.within`} label={`${band}, within`} isLength />
      ) : (
        <span className="pt-1 text-lead">
          {found ? <LengthText ticks={found.within} unit={unit} /> : typed?.within}
        </span>
      )}
      {index === 0 ? (
        <span className="pt-2 text-text text-ink-2">nothing</span>
      ) : size.isOwn ? (
        <BandField size={size} suffix={`${at}.lose`} label={`${band}, points`} />
      ) : (
        <span className="pt-1 text-lead">{found ? pointsAsText(found.lose) : typed?.lose}</span>
      )}
      {(['rule', 'caliper'] as const).map((id) => (
        <Chance key={id} chance={chance?.chances[id] ?? null} />
      ))}
      {size.isOwn ? <BandKeys {...{ size, side, index, band, read }} /> : <span />}
      <ChanceLine chance={chance} />
    </div>
  );
}

function Chance({ chance }: { chance: number | null }) {
  return (
    <span className={classNames(CHANCE, isLarge(chance) ? 'font-[660]' : 'text-ink-2')}>
      {chance === null ? (
        <>
          <span aria-hidden>–</span>
          <span className="sr-only">costs no more there</span>
        </>
      ) : (
        chanceInShort(chance)
      )}
    </span>
  );
}

/** On narrow paper the chances of a band stand in words below it. */
function ChanceLine({ chance }: { chance: BandChance | null }) {
  const { rule, caliper } = chance?.chances ?? { rule: null, caliper: null };
  if (rule === null || caliper === null) return null;
  return (
    <span
      className={classNames(
        'col-span-3 pb-1 text-small @min-[28rem]:hidden',
        isLarge(rule) ? 'font-[600]' : 'text-ink-2',
      )}
    >
      priced dearer by the rule {sayChance(rule)}, by the caliper {sayChance(caliper)}
    </span>
  );
}

interface BandKeysProps {
  size: SizeRuleDesk;
  side: 'over' | 'under';
  index: number;
  band: string;
  read: SizeRule | null;
}

function BandKeys({ size, side, index, band, read }: BandKeysProps) {
  const { unit } = useEditor();
  const graduation = read ? ruleScaleOf([read], unit).graduation : null;
  const middle = read && graduation ? middleOfBand(read[side], index, graduation) : null;
  const isFull = size.rule[side].bands.length >= MOST_BANDS;
  return (
    <span className="flex justify-end gap-1">
      {read && middle !== null && !isFull ? (
        <Button
          kind="quiet"
          size="small"
          className="min-h-9 px-1"
          aria-label={`split ${band}`}
          onClick={() => {
            const next = addEdge(size.rule[side], sideOfRule(read, side), middle, unit);
            if (next) size.change((rule) => Object.assign(rule, { [side]: structuredClone(next) }));
          }}
        >
          split
        </Button>
      ) : null}
      {index === 0 ? null : (
        <Button
          kind="quiet"
          size="small"
          className="min-h-9 px-1"
          aria-label={`take out ${band}`}
          onClick={() =>
            size.change((rule) => Object.assign(rule, { [side]: takeOutBand(rule[side], index) }))
          }
        >
          out
        </Button>
      )}
    </span>
  );
}

/** One more step of the stair, as wide as the last band. */
function AddKey({ size, side, read }: Pick<BandRowsProps, 'size' | 'side' | 'read'>) {
  const { unit } = useEditor();
  const { bands } = size.rule[side];
  function add() {
    const known = read?.[side] ?? [];
    const [before, last] = [known.at(-2)?.within ?? 0, known.at(-1)?.within ?? 0];
    const next = read ? addEdge(size.rule[side], sideOfRule(read, side), 2 * last - before, unit) : null;
    const typed = { within: '', lose: size.rule[side].beyond };
    size.change((rule) =>
      Object.assign(rule, {
        [side]: structuredClone(next ?? { ...rule[side], bands: [...rule[side].bands, typed] }),
      }),
    );
  }
  return (
    <Button kind="quiet" size="small" className="mt-1 px-0" onClick={add}>
      add a band past {bands.at(-1)?.within || 'the last'}
    </Button>
  );
}
