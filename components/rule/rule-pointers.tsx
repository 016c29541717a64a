import { lengthParts } from '@/components/ui/length-parts';
import type { Length } from '@/lib/length';
import { placeOnFace, type RuleLayout } from './rule-layout';
import { RuleNumber } from './rule-number';
import type { RuleScale } from './rule-scale';

/** A reading on the rule: solid for the bench's, open for one's own. */
export interface RulePointer {
  kind: 'bench' | 'own';
  ticks: Length;
  /** Written beside it; without it the deviation is. */
  label?: string;
}

interface RulePointersProps {
  pointers: readonly RulePointer[];
  scale: RuleScale;
  layout: RuleLayout;
}

/** The crow's foot alone, its point at x, y. */
export function CrowsFoot({
  kind,
  x,
  y,
  size,
}: {
  kind: RulePointer['kind'];
  x: number;
  y: number;
  size: number;
}) {
  const half = size * 0.5;
  if (kind === 'bench') {
    return <path d={`M${x} ${y}L${x - half} ${y - size}H${x + half}Z`} className="fill-ink stroke-none" />;
  }
  return (
    <path
      d={`M${x - half * 0.85} ${y - size}L${x} ${y - 1}L${x + half * 0.85} ${y - size}`}
      strokeLinejoin="miter"
      className="fill-none stroke-ink [stroke-width:calc(var(--pen-edge)*0.85)]"
    />
  );
}

export function RulePointers({ pointers, scale, layout }: RulePointersProps) {
  const size = Math.min(24, layout.head * 0.7);
  const placed = pointers
    .map((pointer) => ({ ...pointer, x: placeOnFace(pointer.ticks - scale.target, scale, layout) }))
    .sort((a, b) => a.x - b.x);
  return placed.map((pointer, index) => {
    const last = index === placed.length - 1;
    const before = placed.length > 1 ? !last : pointer.x > layout.width * 0.82;
    const clear = size * 0.5 + 6;
    const x = pointer.x + (before ? -clear : clear);
    const anchor = before ? '[text-anchor:end]' : '[text-anchor:start]';
    return (
      <g key={`${pointer.kind}${pointer.ticks}`}>
        <CrowsFoot kind={pointer.kind} x={pointer.x} y={layout.edge - 2} size={size} />
        {pointer.label ? (
          <text
            x={x}
            y={layout.edge - 8}
            fontSize={layout.price.size}
            className={`fill-ink font-[580] ${anchor}`}
          >
            {pointer.label}
          </text>
        ) : (
          <RuleNumber
            parts={lengthParts(pointer.ticks - scale.target, scale.unit, {}, true)}
            x={x}
            baseline={layout.edge - 8}
            size={layout.price.size * 1.1}
            className={`fill-ink ${anchor}`}
          />
        )}
      </g>
    );
  });
}
