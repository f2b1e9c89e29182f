import { engravingLength } from "#shared/catalogue/build-address.ts";

/** The engraving as it will be cut: twelve places, the text centred in them. Read from the field, so hidden here. */
export function EngravingPreview({ text }: { text: string }) {
  const characters = [...text.trim().toUpperCase()].slice(0, engravingLength);
  const before = Math.floor((engravingLength - characters.length) / 2);
  const places = Array.from({ length: engravingLength }, (_, place) => characters[place - before] ?? "");
  return (
    <div aria-hidden="true" className="mt-2 flex max-w-sm border-2 border-ink bg-wash">
      {places.map((character, place) => (
        <span
          key={place}
          className="flex h-11 grow basis-0 items-center justify-center border-l border-rule text-xl numerals first:border-l-0"
        >
          {character}
        </span>
      ))}
    </div>
  );
}
