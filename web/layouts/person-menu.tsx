import { useMutation } from "@tanstack/react-query";
import { Link, useLocation, useNavigate } from "react-router-dom";
import { useAnnounce } from "#web/components/announcer.tsx";
import { Menu, MenuEntry } from "#web/components/menu.tsx";
import { api, nothing } from "#web/lib/api.ts";
import { mayEnter, useStartAnew } from "#web/lib/session.ts";
import type { SessionView } from "#shared/contracts/session.ts";

const look = "border-rule md:border-l font-condensed text-lg font-semibold hover:bg-wash";

/** Sign in, or the person's own menu. */
export function PersonMenu({ session }: { session: SessionView | undefined }) {
  const { pathname, search } = useLocation();
  const person = session?.person;
  const leave = useSignOut();
  if (session === undefined) return null;
  if (person === null || person === undefined) {
    const here = pathname.startsWith("/account/") ? "" : `?next=${encodeURIComponent(pathname + search)}`;
    return (
      <Link to={`/account/sign-in${here}`} className={`flex min-h-12 items-center px-4 no-underline ${look}`}>
        Sign in
      </Link>
    );
  }
  return (
    <Menu
      label={<span className="max-w-40 truncate">{person.name}</span>}
      className={`min-h-12 px-4 max-md:justify-between ${look}`}
    >
      <MenuEntry>
        <Link to="/account/orders">My orders</Link>
      </MenuEntry>
      <MenuEntry>
        <Link to="/account">My account</Link>
      </MenuEntry>
      {mayEnter("floor", person.role) && (
        <MenuEntry>
          <Link to="/floor">Floor</Link>
        </MenuEntry>
      )}
      {mayEnter("office", person.role) && (
        <MenuEntry>
          <Link to="/office">Office</Link>
        </MenuEntry>
      )}
      <MenuEntry>
        <button type="button" onClick={leave}>
          Sign out
        </button>
      </MenuEntry>
    </Menu>
  );
}

function useSignOut(): () => void {
  const navigate = useNavigate();
  const announce = useAnnounce();
  const startAnew = useStartAnew();
  const { mutate } = useMutation({
    mutationFn: () => api.post("/api/account/sign-out", undefined, nothing),
    onSuccess: async () => {
      await navigate("/");
      await startAnew();
      announce("You are signed out.");
    },
    onError: (error) => {
      announce(`You are still signed in. ${error.message}`);
    },
  });
  return () => {
    mutate();
  };
}
