import { Minus, Plus } from "lucide-react";
import { useState, type SubmitEvent } from "react";

interface QuantityStepperProps {
  /** What is counted, such as "Blocks of Marl, 4.1250 in bore". */
  label: string;
  id: string;
  quantity: number;
  most: number;
  onChange: (quantity: number) => void;
}

const step =
  "inline-flex size-11 items-center justify-center border border-edge bg-sheet hover:bg-wash aria-disabled:text-edge aria-disabled:hover:bg-sheet";

/** A small whole number: typed, or by one up and down. */
export function QuantityStepper({ label, id, quantity, most, onChange }: QuantityStepperProps) {
  const [typed, setTyped] = useState<string | null>(null);
  const set = (next: number) => {
    setTyped(null);
    if (next >= 1 && next <= most && next !== quantity) onChange(next);
  };
  const settle = () => {
    if (typed === null) return;
    const number = Number(typed);
    set(Number.isFinite(number) && typed !== "" ? Math.min(most, Math.max(1, Math.round(number))) : quantity);
  };
  const submit = (event: SubmitEvent<HTMLFormElement>) => {
    event.preventDefault();
    settle();
  };
  return (
    <form onSubmit={submit} className="inline-flex">
      <button
        type="button"
        aria-label={`One fewer: ${label}`}
        aria-disabled={quantity <= 1}
        onClick={() => {
          set(quantity - 1);
        }}
        className={`${step} rounded-l`}
      >
        <Minus aria-hidden="true" className="size-4" />
      </button>
      <input
        id={id}
        aria-label={label}
        inputMode="numeric"
        autoComplete="off"
        value={typed ?? String(quantity)}
        onChange={(event) => {
          setTyped(event.target.value.replace(/\D/g, "").slice(0, 3));
        }}
        onBlur={settle}
        className="h-11 w-14 border-y border-edge bg-sheet text-center text-lg numerals"
      />
      <button
        type="button"
        aria-label={`One more: ${label}`}
        aria-disabled={quantity >= most}
        onClick={() => {
          set(quantity + 1);
        }}
        className={`${step} rounded-r`}
      >
        <Plus aria-hidden="true" className="size-4" />
      </button>
    </form>
  );
}
