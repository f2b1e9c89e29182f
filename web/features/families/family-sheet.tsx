import type { ReactNode } from "react";
import type { CurrentCatalogue } from "#shared/contracts/catalogue.ts";
import { DrawingFrame } from "#web/components/drawing-frame.tsx";
import { TitleBlock } from "#web/components/title-block.tsx";
import { date, inches, money, pounds } from "#web/lib/format.ts";
import { DeckFigure } from "./deck-figure.tsx";
import { familyChoices } from "./family-choices.ts";
import { joined, type FamilySummary } from "./family-summary.ts";

interface FamilySheetProps {
  current: CurrentCatalogue;
  summary: FamilySummary;
  action: ReactNode;
}

/** One family: its deck, its title block, its shown facts with their reasons, and what can be chosen. */
export function FamilySheet({ current, summary, action }: FamilySheetProps) {
  const { family, bores, boreSpacing, deckHeights, fromCents, shipsOn } = summary;
  const { crate } = family;
  return (
    <div className="space-y-10">
      <div className="grid gap-8 lg:grid-cols-[minmax(0,1fr)_20rem]">
        <DrawingFrame
          caption={`Deck of ${family.name} from above, bores at base size`}
          remark="To scale; dimension in inches"
        >
          <div className="p-2 sm:p-6">
            <DeckFigure families={[family]} />
          </div>
        </DrawingFrame>
        <div className="space-y-5">
          <p className="text-lg">{family.summary}</p>
          {action}
          <p className="text-sm text-iron">
            Crate {crate.length} × {crate.width} × {crate.height} in; crate and pallet add{" "}
            {pounds(crate.weight)} to the freight.
          </p>
        </div>
      </div>
      <TitleBlock
        label={family.name}
        cells={[
          { label: "Family", value: family.name },
          { label: "Finish bores", value: bores },
          { label: "Deck heights", value: deckHeights },
          { label: "Bore spacing", value: boreSpacing === null ? "" : inches(boreSpacing, 3) },
          { label: "Weight, bare", value: pounds(family.weight) },
          { label: "Ships from, estimate", value: date(shipsOn) },
          { label: "From", value: money(fromCents), strong: true },
        ]}
      />
      <div className="grid gap-x-12 gap-y-10 lg:grid-cols-2">
        <section aria-labelledby="facts">
          <h2 id="facts" className="text-xl">
            How it is made
          </h2>
          <dl className="mt-2 border-t-2 border-ink">
            {family.facts.map(({ name, value, why }) => (
              <div key={name} className="grid grid-cols-[8.5rem_1fr] gap-x-4 border-b border-rule py-2">
                <dt className="text-iron">{name}</dt>
                <dd>
                  {value}
                  {why !== "" && <span className="block text-sm text-iron">{why}</span>}
                </dd>
              </div>
            ))}
          </dl>
        </section>
        <section aria-labelledby="choices">
          <h2 id="choices" className="text-xl">
            What you may choose
          </h2>
          <dl className="mt-2 border-t-2 border-ink">
            {familyChoices(current, family.id).map(({ id, name, options }) => (
              <div key={id} className="grid grid-cols-[8.5rem_1fr] gap-x-4 border-b border-rule py-2">
                <dt className="text-iron">{name}</dt>
                <dd>
                  {id === "bore" ? bores : joined(options)}
                  {options.length === 1 && (
                    <span className="block text-sm text-iron">One option in this family.</span>
                  )}
                </dd>
              </div>
            ))}
          </dl>
        </section>
      </div>
    </div>
  );
}
