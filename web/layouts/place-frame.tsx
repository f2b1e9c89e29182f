import { useEffect, type ReactNode } from "react";
import { SkipLink } from "#web/components/skip-link.tsx";
import { SiteName } from "#web/components/page-heading.tsx";
import { useSession } from "#web/lib/session.ts";
import { applyTheme } from "#web/lib/theme.ts";
import { SiteFooter } from "./site-footer.tsx";
import { SiteHeader, type HeaderEntry } from "./site-header.tsx";

interface PlaceFrameProps {
  /** The name of the place, shown beside the shop's; null at the Counter. */
  place: string | null;
  /** Where the shop's name leads. */
  home: string;
  entries: HeaderEntry[];
  withCart?: boolean;
  onFloor?: boolean;
  children: ReactNode;
}

/** The frame of every place: header, page, footer. */
export function PlaceFrame({
  place,
  home,
  entries,
  withCart = false,
  onFloor = false,
  children,
}: PlaceFrameProps) {
  const session = useSession();
  useEffect(() => {
    applyTheme(onFloor);
  }, [onFloor]);
  return (
    <SiteName value={session?.shop.name ?? null}>
      <div data-place={onFloor ? "floor" : undefined} className="flex min-h-dvh flex-col">
        <SkipLink />
        <SiteHeader
          session={session}
          place={place}
          home={home}
          entries={entries}
          withCart={withCart}
          onFloor={onFloor}
        />
        <main id="page" tabIndex={-1} className="mx-auto w-full max-w-page grow px-4 py-8 sm:px-6 sm:py-10">
          {children}
        </main>
        <SiteFooter session={session} />
      </div>
    </SiteName>
  );
}
