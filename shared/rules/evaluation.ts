import type { Build } from "../catalogue/build.ts";
import type { Catalogue, Severity, WorkCentre } from "../catalogue/catalogue.ts";
import type { NearestApproach } from "../geometry/rod-clearance.ts";
import type { PriceList } from "../pricing/price-list.ts";
import type { PriceLine } from "../pricing/price-build.ts";
import type { Load } from "../scheduling/estimate.ts";

/** Everything that `evaluate` needs besides the build; nothing else enters (no clock, no randomness). */
export interface EvaluationContext {
  catalogue: Catalogue;
  priceList: PriceList;
  /** Minutes of accepted orders ahead at each work centre. */
  load: Load;
  /** Calendar date in the shop's time zone, ISO, e.g. "2026-12-01". */
  today: string;
}

/** What an option would change against the build as it stands; null where it cannot be said yet. */
export interface OptionEffect {
  /** Cents, signed; null without a family. */
  priceCents: number | null;
  /** Pounds, signed; null without a family. */
  weight: number | null;
  /** Calendar days by which the estimated ship date moves, signed; null without a family. */
  days: number | null;
}

export interface OptionState {
  option: string;
  chosen: boolean;
  /** True exactly when some complete build that breaks no stop rule extends the build with this option. */
  open: boolean;
  effect: OptionEffect;
}

export interface ChoiceState {
  choice: string;
  /** The options that exist for the chosen family, in catalogue order (all of them while no family is chosen). */
  options: OptionState[];
}

/** A minimal set of answers, typed numbers and rules that together close an option. */
export interface Reason {
  /** One plain line: what stands against it. */
  sentence: string;
  answers: { choice: string; option: string }[];
  numbers: string[];
  rules: string[];
}

/** A smallest set of changed answers that makes a closed option open. */
export interface Mend {
  /** `to` is null where the answer is dropped, because the new family does not have that option. */
  changes: { choice: string; from: string; to: string | null }[];
  /** Net effect of the wanted option and the changes together, cents. */
  priceCents: number | null;
  days: number | null;
}

export type FigureUnit =
  "in" | "cu in" | "cc" | "L" | "m/s" | "ft/min" | "hp" | "lb" | "ratio" | "degrees" | "g";

export interface Figure {
  id: string;
  name: string;
  unit: FigureUnit;
  /** null = undecided: it reads a choice or a number that is not known yet. */
  value: number | null;
  /** Decimal places that the shop holds. */
  places: number;
  /** The formula in words, for the reader. */
  formula: string;
  /** The limit it is held against by a rule of the catalogue, if any. */
  limit: { is: ">=" | "<="; value: number; rule: string } | null;
  /** Where a nearest approach is: crank angle, bank, rod and place, for the drawing. Absent where the figure has no place. */
  at?: Omit<NearestApproach, "value">;
}

export interface Finding {
  rule: string;
  severity: Severity;
  sentence: string;
  why: string;
  /** undecided = it reads something unknown: "to be confirmed". */
  undecided: boolean;
  /** The figures that caused it. */
  figures: string[];
  /** The step where it can be changed. */
  step: string;
}

export interface Evaluation {
  build: Build;
  choices: ChoiceState[];
  figures: Figure[];
  /** Stops first, then cautions, then notes. */
  findings: Finding[];
  /** Price of the partial build; null without a family. */
  price: { lines: PriceLine[]; totalCents: number } | null;
  /** Pounds, bare block; null without a family. */
  weight: number | null;
  /** Estimated ship date, ISO; null without a family. */
  shipsOn: string | null;
  /** Of one block; empty without a family. */
  minutes: Partial<Record<WorkCentre, number>>;
  /** Longest lead of the family and its options, calendar days; 0 without a family. */
  leadDays: number;
  /** Choices without an answer, in step order. */
  unanswered: string[];
  /** Complete and free of stops: it may be ordered. */
  orderable: boolean;
}
