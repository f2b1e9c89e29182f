import { Link, useSearchParams } from "react-router-dom";

interface FilterLinksProps {
  /** What is chosen by, such as "State". */
  label: string;
  /** The search parameter that holds the choice. */
  parameter: string;
  current: string;
  options: { value: string; name: string }[];
}

/** Which rows of a list are shown: links in a row, the choice held by the address bar. Choosing starts at the first page. */
export function FilterLinks({ label, parameter, current, options }: FilterLinksProps) {
  const [search] = useSearchParams();
  const to = (value: string) => {
    const next = new URLSearchParams(search);
    next.set(parameter, value);
    next.delete("page");
    return { search: next.toString() };
  };
  return (
    <nav aria-label={label}>
      <ul className="flex flex-wrap">
        {options.map((option) => (
          <li key={option.value} className="-ml-px first:ml-0">
            <Link
              to={to(option.value)}
              preventScrollReset
              aria-current={option.value === current ? "true" : undefined}
              className="inline-flex min-h-target items-center border border-edge bg-sheet px-4 font-condensed text-lg font-semibold no-underline hover:bg-wash aria-[current=true]:bg-ink aria-[current=true]:text-paper in-data-[place=floor]:min-h-target-floor"
            >
              {option.name}
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}
