import { DataTable, type Column } from "#web/components/data-table.tsx";
import { date, inches, money, pounds } from "#web/lib/format.ts";
import type { FamilySummary } from "./family-summary.ts";

const columns: Column<FamilySummary>[] = [
  { id: "family", header: "Family", cell: ({ family }) => family.name },
  { id: "bores", header: "Finish bores", cell: ({ bores }) => bores, numeric: true },
  { id: "decks", header: "Deck heights", cell: ({ deckHeights }) => deckHeights, numeric: true },
  {
    id: "spacing",
    header: "Bore spacing",
    cell: ({ boreSpacing }) => (boreSpacing === null ? "" : inches(boreSpacing, 3)),
    numeric: true,
  },
  { id: "caps", header: "Main caps", cell: ({ mainCaps }) => mainCaps },
  { id: "weight", header: "Bare weight", cell: ({ family }) => pounds(family.weight), numeric: true },
  { id: "ships", header: "Ships from, estimate", cell: ({ shipsOn }) => date(shipsOn), numeric: true },
  {
    id: "price",
    header: "From",
    cell: ({ fromCents }) => money(fromCents).replace(/\.00$/, ""),
    numeric: true,
  },
];

/** The families and the figures that tell them apart; each row leads to its family. */
export function FamilyTable({ families }: { families: FamilySummary[] }) {
  return (
    <DataTable
      caption="Families: price with the least costly option of every choice, without freight and tax"
      columns={columns}
      rows={families}
      rowId={({ family }) => family.id}
      rowLink={({ family }) => `/families/${family.id}`}
    />
  );
}
