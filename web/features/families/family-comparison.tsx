import { Fragment } from "react";
import type { ReactNode } from "react";
import type { CurrentCatalogue } from "#shared/contracts/catalogue.ts";
import { useNarrow } from "#web/components/narrow.ts";
import { date, inches, money, pounds } from "#web/lib/format.ts";
import { familyChoices } from "./family-choices.ts";
import { joined, type FamilySummary } from "./family-summary.ts";

interface ComparisonRow {
  name: string;
  /** One for each family, in their order. */
  values: string[];
  numeric: boolean;
}

interface FamilyComparisonProps {
  current: CurrentCatalogue;
  families: FamilySummary[];
  /** What leads on from a family, under its name. */
  action: (family: string) => ReactNode;
}

/** The families side by side: prices and dates, the shown facts, and what can be chosen in each. Alike rows come last. */
export function FamilyComparison({ current, families, action }: FamilyComparisonProps) {
  const narrow = useNarrow();
  const groups = comparisonGroups(current, families);
  return narrow ? (
    <StackedFamilies families={families} groups={groups} action={action} />
  ) : (
    <table className="w-full table-fixed border-collapse text-left">
      <caption className="sr-only">The families compared</caption>
      <thead className="sticky top-0 z-10 bg-paper">
        <tr className="border-b-2 border-ink">
          <td className="w-44" />
          {families.map(({ family }) => (
            <th key={family.id} scope="col" className="py-3 pr-4 align-bottom">
              <span className="block font-condensed text-2xl font-semibold">{family.name}</span>
              <span className="mt-2 block font-normal">{action(family.id)}</span>
            </th>
          ))}
        </tr>
      </thead>
      {groups.map(({ title, rows }) => (
        <tbody key={title}>
          <tr>
            <th
              scope="rowgroup"
              colSpan={families.length + 1}
              className="pt-6 pb-1 font-condensed text-xl font-semibold"
            >
              {title}
            </th>
          </tr>
          {rows.map((row) => (
            <tr key={row.name} className="border-t border-rule">
              <th scope="row" className="py-2 pr-4 align-top font-normal text-iron">
                {row.name}
              </th>
              {alike(row) ? (
                <td colSpan={families.length} className={row.numeric ? "py-2 numerals" : "py-2"}>
                  {row.values[0]}
                </td>
              ) : (
                row.values.map((value, index) => (
                  <td
                    key={families[index]?.family.id}
                    className={row.numeric ? "py-2 pr-4 align-top numerals" : "py-2 pr-4 align-top"}
                  >
                    {value}
                  </td>
                ))
              )}
            </tr>
          ))}
        </tbody>
      ))}
    </table>
  );
}

interface ComparisonGroup {
  title: string;
  rows: ComparisonRow[];
}

function alike({ values }: ComparisonRow): boolean {
  return values.every((value) => value === values[0]);
}

function comparisonGroups(current: CurrentCatalogue, families: FamilySummary[]): ComparisonGroup[] {
  const row = (name: string, value: (family: FamilySummary) => string, numeric = false): ComparisonRow => ({
    name,
    values: families.map(value),
    numeric,
  });
  const factNames = [...new Set(families.flatMap(({ family }) => family.facts.map(({ name }) => name)))];
  const facts = factNames.map((name) =>
    row(name, ({ family }) => family.facts.find((fact) => fact.name === name)?.value ?? "none"),
  );
  const open = families.map(({ family }) => familyChoices(current, family.id));
  const choices = (open[0] ?? []).map(({ id, name }, at): ComparisonRow => ({
    name,
    values: families.map(({ bores }, index) =>
      id === "bore" ? bores : choiceWords(open[index]?.[at]?.options ?? []),
    ),
    numeric: false,
  }));
  const differentFirst = (rows: ComparisonRow[]) => [
    ...rows.filter((candidate) => !alike(candidate)),
    ...rows.filter(alike),
  ];
  return [
    {
      title: "At a glance",
      rows: [
        row("From", ({ fromCents }) => money(fromCents), true),
        row("Ships from, estimate", ({ shipsOn }) => date(shipsOn), true),
        row("Bare weight", ({ family }) => pounds(family.weight), true),
        row("Bore spacing", ({ boreSpacing }) => (boreSpacing === null ? "" : inches(boreSpacing)), true),
      ],
    },
    { title: "What you may choose", rows: differentFirst(choices) },
    { title: "How it is made", rows: differentFirst(facts) },
  ];
}

function choiceWords(names: string[]): string {
  const most = 5;
  return names.length > most
    ? `${joined(names.slice(0, most))}; and ${names.length - most} more`
    : joined(names);
}

interface StackedFamiliesProps {
  families: FamilySummary[];
  groups: ComparisonGroup[];
  action: (family: string) => ReactNode;
}

/** On phones: each family with its own values, then once what is alike in all. */
function StackedFamilies({ families, groups, action }: StackedFamiliesProps) {
  const common = groups.flatMap(({ rows }) => rows.filter(alike));
  return (
    <div className="space-y-10">
      {families.map(({ family }, index) => (
        <section key={family.id} aria-label={family.name}>
          <h2 className="border-b-2 border-ink pb-1 text-2xl">{family.name}</h2>
          <div className="py-3">{action(family.id)}</div>
          <Rows
            rows={groups
              .flatMap(({ rows }) => rows.filter((row) => !alike(row)))
              .map(({ name, values, numeric }) => ({ name, value: values[index] ?? "", numeric }))}
          />
        </section>
      ))}
      {common.length > 0 && (
        <section aria-label="In all families">
          <h2 className="border-b-2 border-ink pb-1 text-2xl">In all families</h2>
          <Rows
            rows={common.map(({ name, values, numeric }) => ({ name, value: values[0] ?? "", numeric }))}
          />
        </section>
      )}
    </div>
  );
}

function Rows({ rows }: { rows: { name: string; value: string; numeric: boolean }[] }) {
  return (
    <dl className="grid grid-cols-[8.5rem_1fr] gap-x-4">
      {rows.map(({ name, value, numeric }) => (
        <Fragment key={name}>
          <dt className="border-t border-rule py-2 text-iron">{name}</dt>
          <dd className={numeric ? "border-t border-rule py-2 numerals" : "border-t border-rule py-2"}>
            {value}
          </dd>
        </Fragment>
      ))}
    </dl>
  );
}
