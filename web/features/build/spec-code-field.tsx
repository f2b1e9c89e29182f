import { useState, type SubmitEvent } from "react";
import { useNavigate } from "react-router-dom";
import { readSpecVersion } from "#shared/catalogue/spec-code.ts";
import { Button } from "#web/components/button.tsx";
import { TextField } from "#web/components/text-field.tsx";

interface SpecCodeFieldProps {
  /** What stands in the box at first, such as the code that could not be read. */
  given?: string;
}

/** A box for a spec code, typed or pasted, or a whole link with one. A wrong character or group is named. */
export function SpecCodeField({ given = "" }: SpecCodeFieldProps) {
  const navigate = useNavigate();
  const [text, setText] = useState(given);
  const [error, setError] = useState<string>();
  const open = (event: SubmitEvent) => {
    event.preventDefault();
    const search = queryFrom(text);
    const code = search.get("spec") ?? "";
    if (code === "") {
      setError("Type or paste a spec code.");
    } else {
      const read = readSpecVersion(code);
      if (read.ok) {
        void navigate({ pathname: "/build", search: `?${search.toString()}` });
        return;
      }
      setError(read.sentence);
    }
    document.getElementById("spec-code")?.focus();
  };
  return (
    <form onSubmit={open} noValidate className="flex max-w-form flex-wrap items-end gap-3">
      <div className="min-w-0 grow basis-60">
        <TextField
          name="spec-code"
          label="Open a spec code"
          hint="Groups of four characters, typed or pasted; a link to a build will do."
          error={error}
          autoComplete="off"
          autoCapitalize="characters"
          spellCheck={false}
          className="numerals uppercase"
          value={text}
          onChange={(event) => {
            setText(event.target.value);
          }}
        />
      </div>
      <Button type="submit">Open</Button>
    </form>
  );
}

/** The query of a pasted link to a build, or one made of the code alone. */
function queryFrom(text: string): URLSearchParams {
  const typed = text.trim();
  const at = typed.indexOf("?");
  const linked = new URLSearchParams(at < 0 ? "" : typed.slice(at).replace(/#.*$/, ""));
  if (linked.get("spec") !== null) return linked;
  return new URLSearchParams(typed === "" ? [] : [["spec", typed.toUpperCase()]]);
}
