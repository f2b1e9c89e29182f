import type { Severity } from "../catalogue/catalogue.ts";

/** Something in a catalogue or its price list that the shop should know before it is published. */
export interface Flaw {
  kind:
    | "unknownName"
    | "doubleName"
    | "missingPrice"
    | "impossibleFamily"
    | "deadOption"
    | "oneAnswer"
    | "idleRule"
    | "coveredRule";
  /** stop = it must not be published so; caution = very likely a slip; note = it may well be meant. */
  severity: Severity;
  /** One plain line. */
  sentence: string;
  family: string | null;
  choice: string | null;
  options: string[];
  /** The rules that cause it, or in which it stands. */
  rules: string[];
}

/** A flaw with what is said of it; the rest is empty. */
export function flaw(said: Pick<Flaw, "kind" | "severity" | "sentence"> & Partial<Flaw>): Flaw {
  return { family: null, choice: null, options: [], rules: [], ...said };
}
