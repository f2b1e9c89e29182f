import { useId, useState } from "react";
import { Link, NavLink, useLocation, useNavigation } from "react-router-dom";
import { classNames } from "#web/components/class-names.ts";
import type { SessionView } from "#shared/contracts/session.ts";
import { PersonMenu } from "./person-menu.tsx";
import { ThemeMenu } from "./theme-menu.tsx";

export interface HeaderEntry {
  name: string;
  to: string;
  /** Current only at this very address, not below it. */
  exact?: boolean;
}

interface SiteHeaderProps {
  session: SessionView | undefined;
  place: string | null;
  home: string;
  entries: HeaderEntry[];
  withCart: boolean;
  onFloor: boolean;
}

const cell =
  "flex min-h-12 items-center border-rule px-4 font-condensed text-lg font-semibold no-underline hover:bg-wash";
const current =
  "aria-[current=page]:shadow-[inset_0_-3px_0_var(--dye)] max-md:aria-[current=page]:shadow-[inset_4px_0_0_var(--dye)]";

/** The head of every page: cells between thin rules, standing on the edge of a steel rule. */
export function SiteHeader({ session, place, home, entries, withCart, onFloor }: SiteHeaderProps) {
  const { pathname } = useLocation();
  // Keyed by the address, so that the phone's menu closes when the page changes.
  return (
    <header className="bg-sheet print:hidden">
      <div className="mx-auto flex max-w-page flex-wrap items-stretch md:px-6">
        <ShopName session={session} place={place} home={home} />
        <Navigation
          key={pathname}
          entries={entries}
          session={session}
          withCart={withCart}
          onFloor={onFloor}
        />
      </div>
      <div className="relative border-t-2 border-ink bg-paper">
        <Progress />
        <div aria-hidden="true" className="scale-edge" />
      </div>
    </header>
  );
}

function ShopName({ session, place, home }: Pick<SiteHeaderProps, "session" | "place" | "home">) {
  return (
    <Link
      to={home}
      className="flex min-h-14 min-w-0 grow items-center gap-3 px-4 font-condensed text-xl font-semibold no-underline hover:bg-wash md:grow-0 md:pl-0 md:pr-6"
    >
      <svg viewBox="0 0 32 32" aria-hidden="true" className="size-8 shrink-0">
        <path
          d="M16 24 4.500 12.500l6-6L16 12l5.500-5.500 6 6z"
          fill="none"
          stroke="currentColor"
          strokeWidth="2"
        />
        <circle cx="16" cy="21" r="5" fill="var(--sheet)" stroke="currentColor" strokeWidth="2" />
        <path d="M16 2v28M3 21h26" stroke="var(--dye)" strokeWidth="1" strokeDasharray="6 2 1 2" />
      </svg>
      <span className="min-w-0 truncate">
        {session?.shop.name ?? <span className="sr-only">Home</span>}
        {place !== null && <span className="text-iron"> / {place}</span>}
      </span>
    </Link>
  );
}

function Navigation({ entries, session, withCart, onFloor }: Omit<SiteHeaderProps, "place" | "home">) {
  const [open, setOpen] = useState(false);
  const panelId = useId();
  const cart = withCart ? <CartCell count={session?.cartCount ?? 0} /> : null;
  return (
    <>
      <div className="flex items-stretch md:hidden">
        {cart}
        <button
          type="button"
          aria-expanded={open}
          aria-controls={panelId}
          onClick={() => {
            setOpen(!open);
          }}
          className={classNames(cell, "border-l")}
        >
          Menu
        </button>
      </div>
      <div
        id={panelId}
        className={classNames(
          "w-full items-stretch border-rule max-md:flex-col max-md:border-t-2 max-md:border-ink md:flex md:w-auto md:grow",
          open ? "flex" : "hidden",
        )}
      >
        <nav aria-label="Main" className="md:flex md:grow">
          <ul className="items-stretch divide-rule max-md:divide-y md:flex md:border-l md:border-rule">
            {entries.map((entry) => (
              <li key={entry.to} className="flex md:border-r md:border-rule">
                <NavLink
                  to={entry.to}
                  end={entry.exact ?? false}
                  className={classNames(cell, current, "grow")}
                >
                  {entry.name}
                </NavLink>
              </li>
            ))}
          </ul>
        </nav>
        <div className="flex items-stretch divide-rule border-rule max-md:flex-col max-md:divide-y max-md:border-t md:border-r">
          <div className="hidden md:flex">{cart}</div>
          <PersonMenu session={session} />
          <ThemeMenu onFloor={onFloor} />
        </div>
      </div>
    </>
  );
}

function CartCell({ count }: { count: number }) {
  return (
    <NavLink to="/cart" className={classNames(cell, current, "gap-2 border-l")}>
      Cart{" "}
      <span
        className={classNames(
          "min-w-6 border px-1 text-center text-base leading-6 numerals",
          count === 0 ? "border-rule text-iron" : "border-dye bg-dye text-on-dye",
        )}
      >
        {count}
      </span>
      <span className="sr-only">{count === 1 ? " block" : " blocks"}</span>
    </NavLink>
  );
}

/** A line that grows along the rule while the next page is on its way. */
function Progress() {
  const { state } = useNavigation();
  if (state === "idle") return null;
  return (
    <div aria-hidden="true" className="absolute inset-x-0 -top-0.5 h-0.5 origin-left animate-pulse bg-dye" />
  );
}
