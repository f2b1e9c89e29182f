import type { Catalogue } from "#shared/catalogue/catalogue.ts";
import type { Evaluation, Mend, OptionEffect } from "#shared/rules/evaluation.ts";
import { date, daysChange, money, moneyChange, poundsChange } from "#web/lib/format.ts";

/** Amounts in whole dollars without their cents: "+$310", "−$45.50". */
function shortMoneyChange(cents: number): string {
  return moneyChange(cents).replace(/\.00$/, "");
}

/** The parts of an effect that are not nil: price, days, weight. Empty where nothing changes. */
export function effectParts({ priceCents, days, weight }: OptionEffect): string[] {
  const parts: string[] = [];
  if (priceCents !== null && priceCents !== 0) parts.push(shortMoneyChange(priceCents));
  if (days !== null && days !== 0) parts.push(daysChange(days));
  if (weight !== null && Math.round(weight) !== 0) parts.push(poundsChange(weight));
  return parts;
}

/** "cap style" in the middle of a sentence; names that begin with a sign or a shortening stay as they are. */
export function inSentence(name: string): string {
  return /^[A-Z][a-z]/.test(name) ? name.charAt(0).toLowerCase() + name.slice(1) : name;
}

/** Name of a choice, and of an option of it; the id itself where the catalogue does not know it. */
export function choiceName(catalogue: Catalogue, choice: string): string {
  return catalogue.choices.find(({ id }) => id === choice)?.name ?? choice;
}

export function optionName(catalogue: Catalogue, choice: string, option: string): string {
  const options = catalogue.choices.find(({ id }) => id === choice)?.options;
  return options?.find(({ id }) => id === option)?.name ?? option;
}

/** An option in the middle of a sentence; families have names of their own. */
function optionInSentence(catalogue: Catalogue, choice: string, option: string): string {
  const name = optionName(catalogue, choice, option);
  return choice === "family" ? name : inSentence(name);
}

/** What the mend's button says: "Also change cap style to four-bolt splayed, +$310, +2 days". */
export function mendWords(catalogue: Catalogue, mend: Mend, lead = "Also"): string {
  const changes = mend.changes.map(({ choice, to }) =>
    to === null
      ? `drop ${inSentence(choiceName(catalogue, choice))}`
      : `change ${inSentence(choiceName(catalogue, choice))} to ${optionInSentence(catalogue, choice, to)}`,
  );
  const effect: string[] = [];
  if (mend.priceCents !== null) {
    effect.push(mend.priceCents === 0 ? "same price" : shortMoneyChange(mend.priceCents));
  }
  if (mend.days !== null && mend.days !== 0) effect.push(daysChange(mend.days));
  const words = `${lead} ${listed(changes)}`.trim();
  return [words.charAt(0).toUpperCase() + words.slice(1), ...effect].join(", ");
}

function listed(parts: string[]): string {
  const last = parts.at(-1) ?? "";
  return parts.length < 2 ? last : `${parts.slice(0, -1).join(", ")} and ${last}`;
}

/** What is read out after a change: "Price $4,310.00, up $310.00; ships 12 May 2026". */
export function outcomeWords(before: Evaluation, after: Evaluation): string {
  const parts: string[] = [];
  if (after.price !== null) {
    const change = after.price.totalCents - (before.price?.totalCents ?? after.price.totalCents);
    const turn = change === 0 ? "" : `, ${change > 0 ? "up" : "down"} ${money(Math.abs(change))}`;
    parts.push(`Price ${money(after.price.totalCents)}${turn}`);
  }
  if (after.shipsOn !== null) parts.push(`ships ${date(after.shipsOn)}`);
  const stops = stopCount(after);
  if (stops > 0) parts.push(stops === 1 ? "one stop" : `${stops} stops`);
  if (parts.length === 0) parts.push("No price yet: no family is chosen");
  return parts.join("; ");
}

export function stopCount(evaluation: Evaluation): number {
  return evaluation.findings.filter(({ severity }) => severity === "stop").length;
}

/** Where the build stands: "14 of 22", "1 stop", "Complete". */
export function stateWords(evaluation: Evaluation): string {
  const stops = stopCount(evaluation);
  if (stops > 0) return stops === 1 ? "1 stop" : `${stops} stops`;
  const all = evaluation.choices.length;
  const left = evaluation.unanswered.length;
  return left === 0 ? "Complete" : `${all - left} of ${all}`;
}

/** A date for narrow places: "12 May 2026", "11 Dec 2026". */
export function shortDate(isoDate: string): string {
  return date(isoDate).replace(/([A-Z][a-z]{2})[a-z]+/, "$1");
}
