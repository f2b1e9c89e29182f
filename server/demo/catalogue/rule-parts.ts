import type { RuleDocument } from "./document.ts";

/** What the demo's rules are made of. */
type ExpressionRule = Extract<RuleDocument, { kind: "expression" }>;
type ConditionDocument = ExpressionRule["require"];

export const common = "Common practice, no published source.";
export const invented = "House limit, invented for the demo.";
export const fromMemory = "From memory, no published source at hand.";

export const choice = (id: string, ...options: string[]): ConditionDocument => ({ choice: id, in: options });
export const rodKind = (...kinds: string[]): ConditionDocument => ({ word: "rodKind", in: kinds });
export const figureAtLeast = (figure: string, constant: number): ConditionDocument => ({
  left: { figure },
  is: ">=",
  right: { constant },
});
export const figureAtMost = (figure: string, constant: number): ConditionDocument => ({
  left: { figure },
  is: "<=",
  right: { constant },
});
export const numberAtLeast = (number: string, constant: number): ConditionDocument => ({
  left: { number },
  is: ">=",
  right: { constant },
});
export const numberAtMost = (number: string, constant: number): ConditionDocument => ({
  left: { number },
  is: "<=",
  right: { constant },
});
