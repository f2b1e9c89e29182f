import { createContext, useContext, useEffect, useRef, type ReactNode } from "react";
import { useLocation } from "react-router-dom";

/** The name that stands behind the page's own in the window's title. */
export const SiteName = createContext<string | null>(null);

interface PageHeadingProps {
  /** The page's name, also the window's title. */
  title: string;
  /** Small words above: place, step, number. */
  over?: ReactNode;
  /** One or two lines under the heading. */
  lead?: ReactNode;
  /** Buttons at the right. */
  actions?: ReactNode;
}

/** The browser itself begins to read at the page it landed on; only after leaving that is focus moved. */
const landing = { path: window.location.pathname, left: false };

/** The h1 of a page. It takes focus when the reader came here from another page, so that it is read out. */
export function PageHeading({ title, over, lead, actions }: PageHeadingProps) {
  const heading = useRef<HTMLHeadingElement>(null);
  const site = useContext(SiteName);
  const { pathname } = useLocation();
  useEffect(() => {
    document.title = site === null ? title : `${title} · ${site}`;
  }, [site, title]);
  useEffect(() => {
    if (pathname !== landing.path) landing.left = true;
    if (landing.left) heading.current?.focus({ preventScroll: true });
  }, [pathname]);
  return (
    <div className="flex flex-wrap items-end justify-between gap-x-8 gap-y-4">
      <div className="min-w-0">
        {over !== undefined && <p className="cell-label">{over}</p>}
        <h1 ref={heading} tabIndex={-1} className="text-2xl sm:text-3xl">
          {title}
        </h1>
        {lead !== undefined && <div className="mt-2 max-w-text text-lg text-iron">{lead}</div>}
      </div>
      {actions !== undefined && <div className="flex flex-wrap gap-3">{actions}</div>}
    </div>
  );
}
