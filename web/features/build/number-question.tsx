import { useEffect, useRef, useState } from "react";
import type { NumberField as Field } from "#shared/catalogue/catalogue.ts";
import { admitNumber, type Admission } from "#shared/rules/admit-number.ts";
import { useAnnounce } from "#web/components/announcer.tsx";
import { NumberField } from "#web/components/text-field.tsx";
import { useBuildDesk } from "./build-desk.tsx";
import { mendWords } from "./build-words.ts";
import { MendOffer } from "./closed-option.tsx";

const unitNames: Record<Field["unit"], string> = {
  in: "inches",
  cc: "cubic centimetres",
  rpm: "revolutions per minute",
  hp: "horsepower",
};

type Refusal = Extract<Admission, { ok: false }> & { text: string };

/**
 * A number that may be typed or left unknown. One that would leave nothing open is treated as a closed option:
 * the reason and the mend are shown, what was typed stays in the box, and the build stays as it was.
 */
export function NumberQuestion({ field }: { field: Field }) {
  const { current, build, evaluation, setNumber, setNumberWithMend } = useBuildDesk();
  const known = build.numbers[field.id] ?? "";
  const [draft, setDraft] = useState<string | null>(null);
  const [refused, setRefused] = useState<(Refusal & { at: typeof evaluation }) | null>(null);

  const box = useRef<HTMLDivElement>(null);
  const announce = useAnnounce();
  useEffect(() => {
    // The reason takes room above the box, which must not slip under the title block while it is typed into.
    if (refused !== null && box.current?.contains(document.activeElement) === true)
      box.current.scrollIntoView({ block: "nearest" });
  }, [refused]);

  /** Whether what is typed stands in the build now. */
  const settle = (): boolean => {
    if (draft === null) return refused === null;
    const text = draft.replaceAll(/[\s,_]/g, "").replace("−", "-");
    if (text === known) {
      setDraft(null);
      setRefused(null);
      return true;
    }
    const value = text === "" ? null : text;
    const admission = admitNumber(current, build, field.id, value);
    if (!admission.ok) {
      setRefused({ ...admission, text, at: evaluation });
      announce(admission.reason.sentence);
      return false;
    }
    setNumber(field.id, value === null ? null : plain(value));
    setDraft(null);
    setRefused(null);
    return true;
  };

  // After another change the refusal may not hold any more: it is asked again when the box is left or Enter pressed.
  const standing = refused?.at === evaluation ? refused : null;
  const offer = standing?.mend ?? null;
  return (
    <div ref={box} className="max-w-text scroll-my-28">
      <NumberField
        name={field.id}
        label={field.name}
        hint={field.hint === "" ? undefined : field.hint}
        error={standing?.reason.sentence}
        optional
        unit={field.unit}
        unitName={unitNames[field.unit]}
        inputMode={keyboardFor(field)}
        value={draft ?? known}
        onChange={(event) => {
          setDraft(event.target.value);
        }}
        onBlur={settle}
        onKeyDown={(event) => {
          if (event.key === "Enter" && !settle()) event.preventDefault();
        }}
      />
      {standing !== null && offer !== null && (
        <div className="mt-2">
          <MendOffer
            words={mendWords(current.catalogue, offer)}
            onTake={() => {
              setDraft(null);
              setRefused(null);
              setNumberWithMend(field.id, plain(standing.text), offer);
            }}
          />
        </div>
      )}
    </div>
  );
}

/** A telephone's number pads have no minus sign. */
function keyboardFor({ least, step }: Field): "text" | "numeric" | "decimal" {
  if (least < 0) return "text";
  return Number.isInteger(step) ? "numeric" : "decimal";
}

/** "0450" and "450." as "450", ".5" as "0.5": plain decimal text as an address carries it. */
function plain(text: string): string {
  const [whole = "", fraction = ""] = text.replace(/^\+/, "").split(".");
  const digits = whole.replace(/^(-?)0+(?=\d)/, "$1").replace(/^-?$/, "$&0");
  const places = fraction.replace(/^(\d{4})0+$/, "$1");
  return places === "" ? digits : `${digits}.${places}`;
}
