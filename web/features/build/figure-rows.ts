import type { Figure } from "#shared/rules/evaluation.ts";
import type { FigureRow } from "#web/components/figure-list.tsx";
import { fixed } from "#web/lib/format.ts";
import type { LengthUnit } from "./length-unit.ts";

const millimetresPerInch = 25.4;
/** 1 ft = 0.3048 m exactly. */
const feetPerMinute = 60 / 0.3048;
/** 1 cu in = 16.387064 cm³ exactly. */
const cubicCentimetresPerCubicInch = 16.387064;

const inWords = { ">=": "at least", "<=": "at most" } as const;

/** The figures as rows: figures of one name share a row, a range is one figure, lengths stand in the unit asked for. */
export function figureRows(figures: readonly Figure[], unit: LengthUnit): FigureRow[] {
  const rows: FigureRow[] = [];
  const taken = new Set<string>();
  for (const figure of figures) {
    if (taken.has(figure.id)) continue;
    const kin = figures.filter((other) => belongTogether(figure, other));
    kin.forEach(({ id }) => taken.add(id));
    rows.push({
      id: figure.id,
      name: kin.length > 1 ? rangeName(figure) : figure.name,
      value: kin.some(({ value }) => value === null) ? null : together(kin, unit),
      formula: figure.formula,
      ...(figure.limit === null
        ? {}
        : { limit: `${inWords[figure.limit.is]} ${amount(figure, figure.limit.value, unit)}` }),
    });
  }
  return rows;
}

/** "Low" and "high" of one range, or one figure in two units. */
function belongTogether(a: Figure, b: Figure): boolean {
  return (
    a.id === b.id || a.name === b.name || (isRangeEnd(a) && isRangeEnd(b) && rangeName(a) === rangeName(b))
  );
}

const isRangeEnd = ({ name }: Figure) => /, (low|high)$/.test(name);
const rangeName = ({ name }: Figure) => name.replace(/, (low|high)$/, "");

function together(kin: readonly Figure[], unit: LengthUnit): string {
  const [first, second] = kin;
  if (first === undefined || first.value === null) return "";
  if (second !== undefined && second.value !== null && isRangeEnd(first)) {
    return `${fixed(first.value, first.places)} to ${amount(second, second.value, unit)}`;
  }
  return kin.map((figure) => (figure.value === null ? "" : amount(figure, figure.value, unit))).join(" · ");
}

function amount({ unit: own, places }: Figure, value: number, unit: LengthUnit): string {
  switch (own) {
    case "in":
      return unit === "mm" ? `${fixed(value * millimetresPerInch, 2)} mm` : `${fixed(value, places)} in`;
    case "cu in":
      return `${fixed(value, places)} cu in · ${fixed(value * cubicCentimetresPerCubicInch, 0)} cc`;
    case "m/s":
      return unit === "mm"
        ? `${fixed(value, places)} m/s`
        : `${fixed(value * feetPerMinute, 0)} ft/min · ${fixed(value, places)} m/s`;
    case "ratio":
      return fixed(value, places);
    case "degrees":
      return `${fixed(value, places)}°`;
    case "cc":
    case "L":
    case "ft/min":
    case "hp":
    case "lb":
    case "g":
      return `${fixed(value, places)} ${own}`;
  }
}
