import { NavLink, Outlet } from "react-router-dom";
import { useSession } from "#web/lib/session.ts";
import { CounterFrame } from "./counter-layout.tsx";

const entries = [
  { name: "My orders", to: "/account/orders" },
  { name: "My account", to: "/account" },
];

/** Signing in and what is one's own: the Counter's frame with its own short row of pages once signed in. */
export function AccountLayout() {
  const person = useSession()?.person ?? null;
  return (
    <CounterFrame>
      {person !== null && (
        <nav aria-label="Account" className="mb-8 border-b border-edge">
          <ul className="flex gap-6">
            {entries.map((entry) => (
              <li key={entry.to}>
                <NavLink
                  to={entry.to}
                  end
                  className="flex min-h-target items-center font-condensed text-lg font-semibold no-underline hover:underline aria-[current=page]:shadow-[inset_0_-3px_0_var(--dye)]"
                >
                  {entry.name}
                </NavLink>
              </li>
            ))}
          </ul>
        </nav>
      )}
      <Outlet />
    </CounterFrame>
  );
}
