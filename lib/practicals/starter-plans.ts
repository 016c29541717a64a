import type { Unit } from '@/lib/length';
import type { PresetId } from '@/lib/scoring/rubric-form';
import type { DraftSizeRule } from './draft';

export const STARTER_IDS = [
  'bench-hook',
  'six-stick',
  'desk-caddy',
  'stair-tower',
  'wall-rack',
  'gauge-kit',
] as const;

export type StarterId = (typeof STARTER_IDS)[number];

/** Sizes are thickness x width x length, as typed. What is left out is as in every new rubric. */
export interface StarterPlan {
  id: StarterId;
  title: string;
  unit: Unit;
  about: string;
  instructions: string;
  material: string;
  blank: string;
  kerf: string;
  lines: [id: string, label: string, quantity: number, size: string, note?: string][];
  bands?: DraftSizeRule;
  workChecks?: { id: string; label: string; pass: string; fail: string; lose: string }[];
  grossLimit?: string;
  agreeWithin?: string;
  presets?: PresetId[];
}

const LAID_OUT = {
  id: 'laid-out',
  label: 'cut lines laid out before the first cut',
  pass: 'laid out',
  fail: 'not laid out',
  lose: '1',
};

/** In 64ths, and twice as dear over the size: a stick that is too fat goes nowhere. */
const STICK_BANDS: DraftSizeRule = {
  mirrored: false,
  over: {
    bands: [
      { within: '1/64', lose: '0' },
      { within: '1/32', lose: '2' },
      { within: '3/64', lose: '4' },
    ],
    beyond: '6',
  },
  under: {
    bands: [
      { within: '1/64', lose: '0' },
      { within: '1/32', lose: '1' },
      { within: '3/64', lose: '2' },
    ],
    beyond: '3',
  },
  cap: '',
};

/** Six first practicals: three in inches for a saw and a plane, one of pieces that look alike, two in millimetres. */
export const STARTERS: Record<StarterId, StarterPlan> = {
  'bench-hook': {
    id: 'bench-hook',
    title: 'Bench-hook kit',
    unit: 'in',
    about: 'A first practical: a few rips and crosscuts, five pieces.',
    instructions: [
      'Make the five pieces of a bench hook from one blank.',
      'Lay out every cut with knife and square before you begin, and mark which side of each line is waste. The kerf comes out of the waste, never out of the piece.',
      'Rip the width of the base over the whole length first. The strip that is left gives hook and fence, and the narrow rest of it the guides. Then crosscut. Write your name and period on the broad face of each piece.',
    ].join('\n\n'),
    material: 'poplar',
    blank: '3/4 x 7 x 13',
    kerf: '1/8',
    lines: [
      ['base', 'base', 1, '3/4 x 4 1/2 x 9'],
      ['hook', 'hook', 1, '3/4 x 1 1/4 x 5'],
      ['fence', 'fence', 1, '3/4 x 1 1/4 x 4 1/4'],
      ['guide', 'guide', 2, '3/4 x 3/4 x 3', 'a pair: cut both at one stop setting'],
    ],
  },
  'six-stick': {
    id: 'six-stick',
    title: 'Six-stick puzzle',
    unit: 'in',
    about: 'Tight bands in 64ths. What is too fat costs twice, because it must fit.',
    instructions: [
      'Make six equal square sticks and a short key from one blank.',
      'Bring the blank to thickness, rip it into two squares, then cut all six sticks at one stop setting. Keep the arrises sharp: the notches come later and begin from these faces.',
      'A stick that is a little thin still slides. One that is a little fat does not go in at all, so oversize costs twice.',
    ].join('\n\n'),
    material: 'maple',
    blank: '7/8 x 1 7/8 x 15',
    kerf: '1/8',
    lines: [
      ['stick', 'stick', 6, '3/4 x 3/4 x 3 3/4', 'all six alike'],
      ['key', 'key', 1, '3/4 x 3/4 x 1 1/2'],
    ],
    bands: STICK_BANDS,
    agreeWithin: '1/64',
    presets: ['oversize-doubles'],
  },
  'desk-caddy': {
    id: 'desk-caddy',
    title: 'Desk caddy',
    unit: 'in',
    about: 'Seven flat parts in pairs that must match.',
    instructions: [
      'Make the seven parts of a desk caddy from one board.',
      'Plane the board to thickness first, so that every part comes out of the same setting. Rip one wide strip and one narrow strip, then cut each pair at one stop setting.',
      'Lay the parts out as they will be glued. Grain runs along the length of every part.',
    ].join('\n\n'),
    material: 'alder',
    blank: '5/8 x 6 x 22 1/2',
    kerf: '1/8',
    lines: [
      ['base', 'base', 1, '1/2 x 3 1/2 x 7'],
      ['end', 'end', 2, '1/2 x 3 1/2 x 4'],
      ['side', 'side', 2, '1/2 x 2 x 7'],
      ['divider', 'divider', 2, '1/2 x 2 x 3 1/2'],
    ],
  },
  'stair-tower': {
    id: 'stair-tower',
    title: 'Stair tower',
    unit: 'in',
    about: 'Seven blocks, each a quarter longer than the last, easily taken for one another.',
    instructions: [
      'Make seven blocks of one section, each a quarter of an inch longer than the one before it.',
      'Bring the blank to 1 x 1 1/4 over its whole length, then crosscut from the longest block to the shortest. Number each block on one end as it comes off the saw.',
      'Hand them in standing in order. A block in the place of its neighbour is priced as that neighbour.',
    ].join('\n\n'),
    material: 'pine',
    blank: '1 1/4 x 1 1/2 x 18 1/2',
    kerf: '1/8',
    lines: [
      ['block-1', 'block 1', 1, '1 x 1 1/4 x 1 1/2'],
      ['block-2', 'block 2', 1, '1 x 1 1/4 x 1 3/4'],
      ['block-3', 'block 3', 1, '1 x 1 1/4 x 2'],
      ['block-4', 'block 4', 1, '1 x 1 1/4 x 2 1/4'],
      ['block-5', 'block 5', 1, '1 x 1 1/4 x 2 1/2'],
      ['block-6', 'block 6', 1, '1 x 1 1/4 x 2 3/4'],
      ['block-7', 'block 7', 1, '1 x 1 1/4 x 3'],
    ],
    grossLimit: '3/16',
    workChecks: [
      { id: 'in-order', label: 'blocks in order', pass: 'in order', fail: 'out of order', lose: '1' },
    ],
  },
  'wall-rack': {
    id: 'wall-rack',
    title: 'Wall rack',
    unit: 'mm',
    about: 'Posts and thin slats from one squared blank, in millimetres.',
    instructions: [
      'Make the posts, foot and slats of a small wall rack from one squared blank.',
      'Rip one square strip over the whole length for the posts and the foot. Rip the rest into three strips for the slats and crosscut each in two.',
      'The six slats must match: set the fence once for all of them, and the stop once.',
    ].join('\n\n'),
    material: 'pine',
    blank: '35 x 85 x 560',
    kerf: '3',
    lines: [
      ['post', 'post', 2, '35 x 35 x 180', 'a pair'],
      ['foot', 'foot', 1, '35 x 35 x 120'],
      ['slat', 'slat', 6, '13 x 35 x 260', 'all six alike'],
    ],
    workChecks: [LAID_OUT],
  },
  'gauge-kit': {
    id: 'gauge-kit',
    title: 'Gauge kit',
    unit: 'mm',
    about: 'Heads, stems and wedges for two marking gauges, in millimetres.',
    instructions: [
      'Make the heads, stems and wedges of two marking gauges from one blank.',
      'Crosscut the heads first and rip the stems from what is left. The stems slide in the heads, so their thickness and width matter most: try each face with a square as you go.',
      'Saw the wedges last. Grain runs along every piece.',
    ].join('\n\n'),
    material: 'beech',
    blank: '24 x 105 x 430',
    kerf: '3',
    lines: [
      ['head', 'head', 2, '24 x 50 x 65'],
      ['stem', 'stem', 2, '16 x 16 x 220', 'must slide in the heads'],
      ['wedge', 'wedge', 2, '10 x 16 x 80'],
    ],
  },
};
