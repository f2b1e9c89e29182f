import { encodeSpec } from "#shared/catalogue/spec-code.ts";
import type { BuildView } from "#shared/contracts/build.ts";
import type { Catalogue } from "#shared/catalogue/catalogue.ts";
import type { Evaluation, EvaluationContext } from "#shared/rules/evaluation.ts";

/**
 * A complete build as it stands in carts and orders: frozen words and figures that need no catalogue to be read.
 * @throws Error for a build without a family, which has no price
 */
export function presentBuild({ catalogue, priceList }: EvaluationContext, evaluation: Evaluation): BuildView {
  const { build, price, weight, shipsOn } = evaluation;
  if (price === null || weight === null || shipsOn === null)
    throw new Error("a build without a family has no price");
  const answers = namedAnswers(catalogue, build.answers);
  return {
    specCode: encodeSpec(catalogue, build.answers),
    catalogueVersion: catalogue.version,
    priceListVersion: priceList.version,
    family: catalogue.families.find((family) => family.id === build.answers["family"])?.name ?? "",
    summary: summaryOf(catalogue, build.answers),
    answers,
    numbers: build.numbers,
    figures: evaluation.figures.map(({ id, name, unit, value, places }) => ({
      id,
      name,
      unit,
      value,
      places,
    })),
    findings: evaluation.findings.map(({ rule, severity, sentence, undecided }) => ({
      rule,
      severity,
      sentence,
      undecided,
    })),
    priceLines: price.lines.map(({ kind, label, amountCents }) => ({ kind, label, amountCents })),
    priceCents: price.totalCents,
    weight,
    minutes: evaluation.minutes,
    leadDays: evaluation.leadDays,
    shipsOn,
  };
}

/** Every answer in the words of the catalogue, in step order. */
export function namedAnswers(catalogue: Catalogue, answers: Record<string, string>): BuildView["answers"] {
  return catalogue.steps.flatMap((step) =>
    step.choices.flatMap((id) => {
      const choice = catalogue.choices.find((candidate) => candidate.id === id);
      const option = choice?.options.find((candidate) => candidate.id === answers[id]);
      return choice && option ? [{ step: step.name, choice: choice.name, option: option.name }] : [];
    }),
  );
}

/** "Marl, 4.125 in bore, 9.025 in deck": the family and what tells its blocks apart. */
export function summaryOf(catalogue: Catalogue, answers: Record<string, string>): string {
  const optionName = (choiceId: string): string | undefined =>
    catalogue.choices
      .find((choice) => choice.id === choiceId)
      ?.options.find((option) => option.id === answers[choiceId])?.name;
  const bore = optionName("bore");
  const deck = optionName("deckHeight");
  return [optionName("family"), bore && `${bore} bore`, deck && `${deck} deck`].filter(Boolean).join(", ");
}
