import type { ReactNode } from "react";
import { CautionLine } from "#web/components/caution-line.tsx";
import { telephone } from "#web/lib/format.ts";
import { OutsideLink } from "#web/components/text-link.tsx";
import type { SessionView } from "#shared/contracts/session.ts";

/** The foot of every page, drawn as the title block of the sheet: the shop, how to reach it, what to bear in mind. */
export function SiteFooter({ session }: { session: SessionView | undefined }) {
  const shop = session?.shop;
  return (
    <footer className="mx-auto mt-8 w-full max-w-page px-4 pb-8 sm:px-6 print:hidden">
      <div className="overflow-hidden border-2 border-ink bg-sheet">
        <div className="-mt-px -ml-px flex flex-wrap">
          <Cell label="Shop">
            <span className="font-semibold">{shop?.name}</span>
            {shop?.addressLines.map((line) => (
              <span key={line} className="block">
                {line}
              </span>
            ))}
          </Cell>
          <Cell label="Telephone">
            {shop !== undefined && (
              <OutsideLink href={`tel:${shop.phone.replace(/[^+\d]/g, "")}`}>
                {telephone(shop.phone)}
              </OutsideLink>
            )}
          </Cell>
          <Cell label="E-mail">
            {shop !== undefined && <OutsideLink href={`mailto:${shop.email}`}>{shop.email}</OutsideLink>}
          </Cell>
          {session?.demo && (
            <Cell label="Demonstration">This shop is invented. Nothing is made and no money moves.</Cell>
          )}
          <div className="grow basis-full space-y-1 border-t border-l border-edge px-3 py-2">
            <CautionLine>
              A modified engine may not be lawful on the road: local emissions and vehicle rules apply. Racing
              is dangerous.
            </CautionLine>
            <p className="pl-6 text-sm text-iron">Tax and freight figures are estimates until invoiced.</p>
          </div>
        </div>
      </div>
    </footer>
  );
}

function Cell({ label, children }: { label: string; children: ReactNode }) {
  return (
    <div className="min-h-16 min-w-0 grow basis-52 border-t border-l border-edge px-3 pt-1 pb-2">
      <p className="cell-label">{label}</p>
      <div className="break-words">{children}</div>
    </div>
  );
}
