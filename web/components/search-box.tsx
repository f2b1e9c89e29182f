import type { SubmitEvent } from "react";
import { useSearchParams } from "react-router-dom";
import { Button } from "./button.tsx";
import { controlLook } from "./field.tsx";

interface SearchBoxProps {
  /** What may be typed, such as "Order number, name or e-mail". */
  label: string;
  parameter?: string;
}

/** Searches a list; the words live in the address bar. A scanner that types and sends Enter works it too. */
export function SearchBox({ label, parameter = "search" }: SearchBoxProps) {
  const [search, setSearch] = useSearchParams();
  const present = search.get(parameter) ?? "";
  const show = (words: string) => {
    const next = new URLSearchParams(search);
    if (words === "") next.delete(parameter);
    else next.set(parameter, words);
    next.delete("page");
    setSearch(next, { preventScrollReset: true });
  };
  const submit = (event: SubmitEvent<HTMLFormElement>) => {
    event.preventDefault();
    const words = new FormData(event.currentTarget).get(parameter);
    show(typeof words === "string" ? words.trim() : "");
  };
  // Keyed by the words, so that Back and Forward change what stands in the box.
  return (
    <form role="search" key={present} onSubmit={submit} className="w-full max-w-form">
      <label htmlFor={`${parameter}-box`} className="font-medium">
        {label}
      </label>
      <div className="mt-1.5 flex gap-2">
        <input
          type="search"
          id={`${parameter}-box`}
          name={parameter}
          defaultValue={present}
          maxLength={100}
          autoComplete="off"
          spellCheck={false}
          className={controlLook(undefined, "min-w-0 grow")}
        />
        <Button type="submit">Search</Button>
        {present !== "" && (
          <Button
            look="quiet"
            onClick={() => {
              show("");
            }}
          >
            Clear
          </Button>
        )}
      </div>
    </form>
  );
}
