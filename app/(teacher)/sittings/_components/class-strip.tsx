interface ClassStripProps {
  students: number;
  read: number;
  begun: number;
  /** Absent or excused. */
  away: number;
}

type Kind = 'read' | 'begun' | 'open' | 'away';

const SQUARE = 11;
const STEP = 14;

/** The class as a row of pieces: read, begun, still to come; those away are struck through. */
export function ClassStrip({ students, read, begun, away }: ClassStripProps) {
  const open = Math.max(0, students - read - begun - away);
  const kinds: Kind[] = [
    ...Array<Kind>(read).fill('read'),
    ...Array<Kind>(begun).fill('begun'),
    ...Array<Kind>(open).fill('open'),
    ...Array<Kind>(away).fill('away'),
  ];
  const width = Math.max(1, kinds.length) * STEP;
  return (
    <svg
      viewBox={`0 0 ${width} 16`}
      width={width}
      height={16}
      role="img"
      aria-label={`${read} of ${students} read, ${begun} begun, ${open} to come, ${away} away`}
      className="block max-w-full"
    >
      {kinds.map((kind, index) => (
        <Square key={`${kind}-${index.toString()}`} kind={kind} x={index * STEP + 1} />
      ))}
    </svg>
  );
}

function Square({ kind, x }: { kind: Kind; x: number }) {
  const y = 2;
  return (
    <g className="stroke-ink [stroke-width:var(--pen-inside)]">
      <rect
        x={x}
        y={y}
        width={SQUARE}
        height={SQUARE}
        className={kind === 'read' ? 'fill-ink' : 'fill-none'}
        strokeDasharray={kind === 'away' ? '2 2' : undefined}
      />
      {kind === 'begun' ? (
        <path d={`M${x} ${y + SQUARE}V${y}H${x + SQUARE}Z`} className="fill-ink stroke-none" />
      ) : null}
      {kind === 'away' ? <path d={`M${x} ${y + SQUARE}L${x + SQUARE} ${y}`} fill="none" /> : null}
    </g>
  );
}
