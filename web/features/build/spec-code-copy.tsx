import { useState } from "react";
import { encodeSpec } from "#shared/catalogue/spec-code.ts";
import { useAnnounce } from "#web/components/announcer.tsx";
import { useBuildDesk } from "./build-desk.tsx";

/** Spec code of the build on the bench, or null while nothing is answered. */
export function useSpecCode(): string | null {
  const { current, build } = useBuildDesk();
  return Object.keys(build.answers).length === 0 ? null : encodeSpec(current.catalogue, build.answers);
}

/** The spec code with a button that copies it. */
export function SpecCodeCopy() {
  const code = useSpecCode();
  const announce = useAnnounce();
  const [copied, setCopied] = useState<string | null>(null);
  if (code === null) return "none yet";
  const copy = async () => {
    try {
      await navigator.clipboard.writeText(code);
      setCopied(code);
      announce("Spec code copied.");
    } catch (error) {
      // The browser may refuse the clipboard; the code stands there to be marked and copied by hand.
      if (!(error instanceof DOMException || error instanceof TypeError)) throw error;
      announce("The browser did not let us copy. Mark the code and copy it.");
    }
  };
  return (
    <span className="flex flex-wrap items-baseline gap-x-3">
      <span className="select-all">{code}</span>
      <button
        type="button"
        onClick={() => void copy()}
        className="min-h-6 font-sans text-sm text-dye underline underline-offset-4"
      >
        {copied === code ? "Copied" : "Copy"}
        <span className="sr-only"> the spec code</span>
      </button>
    </span>
  );
}
