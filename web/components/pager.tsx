import { Link, useSearchParams } from "react-router-dom";

interface PagerProps {
  page: number;
  pages: number;
  /** What is counted, for the name of the landmark: "Pages of orders". */
  label: string;
  parameter?: string;
}

const box =
  "inline-flex min-h-target min-w-target items-center justify-center border border-edge bg-sheet px-4 font-semibold no-underline hover:bg-wash";

/** Earlier and later pages; the page lives in the address bar. */
export function Pager({ page, pages, label, parameter = "page" }: PagerProps) {
  const [search] = useSearchParams();
  if (pages <= 1) return null;
  const to = (target: number) => {
    const next = new URLSearchParams(search);
    next.set(parameter, String(target));
    return { search: next.toString() };
  };
  return (
    <nav aria-label={label} className="mt-4 flex items-center gap-4">
      {page > 1 && (
        <Link to={to(page - 1)} rel="prev" className={box}>
          Earlier page
        </Link>
      )}
      <p className="numerals">
        Page {page} of {pages}
      </p>
      {page < pages && (
        <Link to={to(page + 1)} rel="next" className={box}>
          Next page
        </Link>
      )}
    </nav>
  );
}
