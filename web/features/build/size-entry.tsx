import { useState } from "react";
import { controlLook, describedBy, FieldFrame } from "#web/components/field.tsx";

interface SizeEntryProps {
  name: string;
  label: string;
  sizes: { id: string; name: string }[];
  /** Names of the sizes on the chart, smallest first. */
  range: string[];
  onPick: (id: string) => void;
}

/** A box to type a size into; Enter goes to it. */
export function SizeEntry({ name, label, sizes, range, onPick }: SizeEntryProps) {
  const id = `${name}-typed`;
  const [text, setText] = useState("");
  const [error, setError] = useState<string>();
  const pick = () => {
    const typed = text.trim() === "" ? Number.NaN : Number(text.trim().replace(/["”]|in$/g, ""));
    const found = sizes.find((size) => Math.abs(Number.parseFloat(size.name) - typed) < 0.00005);
    if (found !== undefined) {
      setError(undefined);
      setText("");
      onPick(found.id);
    } else if (text.trim() !== "") {
      setError(`There is no ${text.trim()} here. Sizes run from ${range[0] ?? ""} to ${range.at(-1) ?? ""}.`);
    }
  };
  return (
    <div className="mt-3 max-w-56">
      <FieldFrame id={id} label={label} error={error}>
        <input
          id={id}
          inputMode="decimal"
          autoComplete="off"
          enterKeyHint="go"
          aria-invalid={error !== undefined}
          aria-describedby={describedBy(id, undefined, error)}
          className={controlLook(error, "text-lg numerals")}
          value={text}
          onChange={(event) => {
            setText(event.target.value);
          }}
          onKeyDown={(event) => {
            if (event.key !== "Enter" || text.trim() === "") return;
            event.preventDefault();
            pick();
          }}
          onBlur={pick}
        />
      </FieldFrame>
    </div>
  );
}
