import { lineItemsOf } from "./checkout-sessions.ts";
import { invalidRequest } from "./errors.ts";
import { listPage } from "./lists.ts";
import { calculationLinesOf } from "./tax-calculations.ts";
import type { Work } from "./work.ts";

type Fields = Record<string, unknown>;

/** A copy of an answer in which the ids that `expand` names are replaced by their records. */
export function expanded(work: Work, answer: object, paths: string[]): Fields {
  const copy: Fields = { ...structuredClone(answer) };
  for (const path of paths) expandOne(work, copy, path.split("."), path);
  return copy;
}

function expandOne(work: Work, value: unknown, names: string[], path: string): void {
  if (Array.isArray(value)) {
    for (const one of value) expandOne(work, one, names, path);
    return;
  }
  const [name, ...rest] = names;
  if (name === undefined || !isFields(value)) return;
  value[name] = recordAt(work, value, name, path);
  expandOne(work, value[name], rest, path);
}

function recordAt(work: Work, parent: Fields, name: string, path: string): unknown {
  const there = parent[name];
  if (typeof there === "string") return structuredClone(recordOf(work, there) ?? cannotExpand(path));
  if (there !== undefined) return there;
  const id = String(parent["id"]);
  if (parent["object"] === "checkout.session" && name === "line_items") {
    return listPage(structuredClone(lineItemsOf(work, id)), {}, `/v1/checkout/sessions/${id}/line_items`);
  }
  if (parent["object"] === "tax.calculation" && name === "line_items") {
    // A line shows its own taxes only when they are asked for too.
    const lines = calculationLinesOf(work, id).map((line) => ({ ...line, tax_breakdown: undefined }));
    return listPage(lines, {}, `/v1/tax/calculations/${id}/line_items`);
  }
  if (parent["object"] === "tax.calculation_line_item" && name === "tax_breakdown") {
    const lines = Object.values(work.state.calculationLines).flat();
    return structuredClone(lines.find((line) => line.id === id)?.tax_breakdown ?? null);
  }
  return cannotExpand(path);
}

function recordOf(work: Work, id: string): object | undefined {
  return work.state.intents[id] ?? work.state.charges[id] ?? work.state.refunds[id];
}

function cannotExpand(path: string): never {
  throw invalidRequest(`This cannot be expanded: ${path}`, { param: "expand" });
}

function isFields(value: unknown): value is Fields {
  return typeof value === "object" && value !== null;
}
