import { catalogueSchema, type Catalogue, type Condition } from "#shared/catalogue/catalogue.ts";
import type { EvaluationContext } from "#shared/rules/evaluation.ts";

interface PlainOption {
  id: string;
  value?: number;
  cents?: number;
}

interface PlainRule {
  id: string;
  when?: Condition;
  require: Condition;
}

/** A context of one family from choices and rules alone; an option's value is read under its choice's id. */
export function plainContext(
  choices: Record<string, readonly (string | PlainOption)[]>,
  rules: readonly PlainRule[],
): EvaluationContext {
  const described = Object.entries(choices).map(([id, options]) => ({
    id,
    options: options.map((option) => (typeof option === "string" ? { id: option } : option)),
  }));
  const catalogue: Catalogue = catalogueSchema.parse({
    version: 1,
    name: "Plain",
    publishedOn: "2026-01-01",
    families: [
      {
        id: "only",
        name: "Only",
        summary: "",
        values: {},
        weight: 1,
        minutes: {},
        facts: [],
        crate: { length: 1, width: 1, height: 1, weight: 1 },
      },
    ],
    steps: [{ id: "all", name: "All", intro: "", choices: ["family", ...Object.keys(choices)] }],
    choices: [{ id: "family", options: [{ id: "only" }] }, ...described].map(({ id, options }) => ({
      id,
      name: id,
      question: "?",
      help: { what: "", when: "", cost: "" },
      options: options.map((option: PlainOption) => ({
        id: option.id,
        name: option.id,
        values: option.value === undefined ? {} : { [id]: option.value },
      })),
    })),
    numbers: [],
    rules: rules.map((rule) => ({
      kind: "expression",
      severity: "stop",
      sentence: `${rule.id}.`,
      why: "Published example.",
      ...rule,
    })),
  });
  return {
    catalogue,
    priceList: {
      version: 1,
      name: "Plain",
      effectiveOn: "2026-01-01",
      currency: "USD",
      families: { only: 0 },
      options: Object.fromEntries(
        described.map(({ id, options }) => [
          id,
          Object.fromEntries(options.map((option: PlainOption) => [option.id, option.cents ?? 0])),
        ]),
      ),
      freightByZone: {},
    },
    load: { minutes: {} },
    today: "2026-12-01",
  };
}
