type FormValue = string | FormValue[] | FormFields;
export interface FormFields {
  [name: string]: FormValue;
}

type Branch = Map<string, string | Branch>;

/**
 * Reads a form-encoded body or query whose names carry brackets, such as
 * `line_items[0][price_data][currency]=usd` or `expand[]=payment_intent`.
 * Every value stays a string. Numbered names from 0 become a list of any length.
 */
export function parseForm(text: string): FormFields {
  const root: Branch = new Map();
  for (const [name, value] of new URLSearchParams(text)) put(root, namesOf(name), value);
  return Object.fromEntries([...root].map(([name, value]) => [name, grown(value)]));
}

function namesOf(name: string): string[] {
  const open = name.indexOf("[");
  if (open <= 0) return [name];
  return [
    name.slice(0, open),
    ...[...name.slice(open).matchAll(/\[([^\]]*)\]/g)].map((match) => match[1] ?? ""),
  ];
}

function put(branch: Branch, names: string[], value: string): void {
  const [first = "", ...rest] = names;
  const name = first === "" ? String(branch.size) : first;
  if (rest.length === 0) {
    branch.set(name, value);
    return;
  }
  const there = branch.get(name);
  const next: Branch = there instanceof Map ? there : new Map<string, string | Branch>();
  branch.set(name, next);
  put(next, rest, value);
}

function grown(value: string | Branch): FormValue {
  if (typeof value === "string") return value;
  const numbered = [...value.keys()].every((name) => /^\d+$/.test(name));
  if (!numbered) return Object.fromEntries([...value].map(([name, inner]) => [name, grown(inner)]));
  return [...value].sort(([a], [b]) => Number(a) - Number(b)).map(([, inner]) => grown(inner));
}
