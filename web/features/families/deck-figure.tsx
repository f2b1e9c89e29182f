import type { Family } from "#shared/catalogue/catalogue.ts";

interface DeckFigureProps {
  families: readonly Family[];
}

/** Iron beyond the outermost barrels and beside them, inches. */
const end = 0.45;
const side = 0.75;
const margin = { side: 0.3, top: 1.3, bottom: 1.2 };

/**
 * One deck of each family from above, all to one scale: bores at their base size on their spacing, barrels dashed around
 * them. Drawn from the family's own numbers; the same numbers stand in the table beside it, so it is hidden from readers.
 */
export function DeckFigure({ families }: DeckFigureProps) {
  const decks = families.flatMap((family) => {
    const { boreSpacing, baseBore, barrelOutsideDiameter, cylinders } = family.values;
    if (boreSpacing === undefined || baseBore === undefined || barrelOutsideDiameter === undefined) return [];
    const bores = Math.round((cylinders ?? 8) / 2);
    const length = (bores - 1) * boreSpacing + barrelOutsideDiameter + 2 * end;
    const height = barrelOutsideDiameter + 2 * side;
    return [{ family, boreSpacing, baseBore, barrelOutsideDiameter, bores, length, height }];
  });
  // The same frame for each, so that they share one scale.
  const width = Math.max(0, ...decks.map(({ length }) => length)) + 2 * margin.side;
  const height = Math.max(0, ...decks.map((deck) => deck.height)) + margin.top + margin.bottom;
  return (
    <div aria-hidden="true" className="grid gap-x-6 gap-y-1 text-ink sm:auto-cols-fr sm:grid-flow-col">
      {decks.map((deck) => (
        <svg key={deck.family.id} viewBox={`0 0 ${width} ${height}`} className="block w-full">
          <g transform={`translate(${margin.side} ${margin.top})`}>
            <Deck {...deck} />
          </g>
        </svg>
      ))}
    </div>
  );
}

interface DeckProps {
  family: Family;
  boreSpacing: number;
  baseBore: number;
  barrelOutsideDiameter: number;
  bores: number;
  length: number;
  height: number;
}

function Deck({ family, boreSpacing, baseBore, barrelOutsideDiameter, bores, length, height }: DeckProps) {
  const first = end + barrelOutsideDiameter / 2;
  const middle = height / 2;
  const centres = Array.from({ length: bores }, (_, bore) => first + bore * boreSpacing);
  const second = centres[1] ?? first;
  const line = height + 0.65;
  return (
    <g fill="none" stroke="currentColor" strokeWidth="0.06">
      <text
        x="0"
        y="-0.25"
        fill="currentColor"
        stroke="none"
        fontSize="0.95"
        className="font-condensed font-semibold"
      >
        {family.name}
      </text>
      <rect x="0" y="0" width={length} height={height} fill="var(--wash)" />
      {centres.map((x) => (
        <g key={x}>
          <circle
            cx={x}
            cy={middle}
            r={barrelOutsideDiameter / 2}
            strokeDasharray="0.28 0.2"
            stroke="var(--edge)"
            strokeWidth="0.04"
          />
          <circle cx={x} cy={middle} r={baseBore / 2} fill="var(--sheet)" />
          <path
            d={`M${x} 0.3V${height - 0.3}`}
            stroke="var(--dye)"
            strokeWidth="0.03"
            strokeDasharray="0.7 0.15 0.15 0.15"
          />
        </g>
      ))}
      <path
        d={`M0.2 ${middle}H${length - 0.2}`}
        stroke="var(--dye)"
        strokeWidth="0.03"
        strokeDasharray="0.7 0.15 0.15 0.15"
      />
      <g stroke="var(--dye)" strokeWidth="0.035">
        <path
          d={`M${first} ${height - 0.2}V${line + 0.2}M${second} ${height - 0.2}V${line + 0.2}M${first} ${line}H${second}`}
        />
        <path
          d={`M${first} ${line}l0.42 -0.1v0.2zM${second} ${line}l-0.42 -0.1v0.2z`}
          fill="var(--dye)"
          stroke="none"
        />
      </g>
      <text
        x={second + 0.35}
        y={line + 0.3}
        fill="var(--dye)"
        stroke="none"
        fontSize="0.85"
        className="numerals"
      >
        {boreSpacing.toFixed(3)}
      </text>
    </g>
  );
}
