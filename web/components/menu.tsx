import { useEffect, useId, useRef, useState, type FocusEvent, type ReactNode } from "react";
import { classNames } from "./class-names.ts";

interface MenuProps {
  /** What stands on the button. */
  label: ReactNode;
  /** Spoken name of the button, when the label alone does not say it. */
  name?: string;
  /** Links or buttons, each in a MenuEntry. */
  children: ReactNode;
  className?: string;
}

/** A button that opens a short list of links or actions. Escape or leaving it closes it; so does choosing. */
export function Menu({ label, name, children, className }: MenuProps) {
  const [open, setOpen] = useState(false);
  const root = useRef<HTMLDivElement>(null);
  const button = useRef<HTMLButtonElement>(null);
  const listId = useId();

  useEffect(() => {
    if (!open) return;
    const press = (event: PointerEvent) => {
      if (event.target instanceof Node && root.current?.contains(event.target) !== true) setOpen(false);
    };
    const escape = (event: KeyboardEvent) => {
      if (event.key !== "Escape") return;
      setOpen(false);
      button.current?.focus();
    };
    document.addEventListener("pointerdown", press);
    document.addEventListener("keydown", escape);
    return () => {
      document.removeEventListener("pointerdown", press);
      document.removeEventListener("keydown", escape);
    };
  }, [open]);

  const leave = (event: FocusEvent) => {
    if (event.relatedTarget instanceof Node && !event.currentTarget.contains(event.relatedTarget))
      setOpen(false);
  };
  return (
    <div ref={root} className="relative flex" onBlur={leave}>
      <button
        ref={button}
        type="button"
        aria-label={name}
        aria-expanded={open}
        aria-controls={listId}
        onClick={() => {
          setOpen(!open);
        }}
        className={classNames("inline-flex min-h-target items-center gap-2 px-3", className)}
      >
        {label}
        <svg viewBox="0 0 10 6" aria-hidden="true" className={classNames("w-2.5", open && "rotate-180")}>
          <path d="m1 .5 4 4.500 4-4.500" fill="none" stroke="currentColor" strokeWidth="1.500" />
        </svg>
      </button>
      <ul
        id={listId}
        hidden={!open}
        className="absolute top-full right-0 z-30 min-w-52 border-2 border-ink bg-sheet py-1 shadow-float"
        // A press or Enter on an entry bubbles to here; the entries themselves are links and buttons.
        onClickCapture={() => {
          setOpen(false);
        }}
      >
        {children}
      </ul>
    </div>
  );
}

/** One entry of a Menu; its child is the link or button, which takes the whole row. */
export function MenuEntry({ children }: { children: ReactNode }) {
  return (
    <li className="[&>*]:flex [&>*]:min-h-target [&>*]:w-full [&>*]:items-center [&>*]:gap-2 [&>*]:px-4 [&>*]:text-left [&>*]:hover:bg-wash">
      {children}
    </li>
  );
}
