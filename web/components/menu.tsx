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

/** A button that opens a short list of links or actions. Escape or leaving it closes it; so does choosing.
 * Floats on wide screens; on phones it opens in the flow of the page, where it cannot be cut off. */
export function Menu({ label, name, children, className }: MenuProps) {
  const [open, setOpen] = useState(false);
  const root = useRef<HTMLDivElement>(null);
  const button = useRef<HTMLButtonElement>(null);
  const list = useRef<HTMLUListElement>(null);
  const listId = useId();

  useEffect(() => {
    if (!open) return;
    const press = (event: PointerEvent) => {
      if (event.target instanceof Node && root.current?.contains(event.target) !== true) setOpen(false);
    };
    const choose = (event: MouseEvent) => {
      if (!(event.target instanceof Node) || list.current?.contains(event.target) !== true) return;
      setOpen(false);
      button.current?.focus();
    };
    const escape = (event: KeyboardEvent) => {
      if (event.key !== "Escape") return;
      setOpen(false);
      button.current?.focus();
    };
    document.addEventListener("pointerdown", press);
    document.addEventListener("click", choose);
    document.addEventListener("keydown", escape);
    return () => {
      document.removeEventListener("pointerdown", press);
      document.removeEventListener("click", choose);
      document.removeEventListener("keydown", escape);
    };
  }, [open]);

  const leave = (event: FocusEvent) => {
    if (event.relatedTarget instanceof Node && !event.currentTarget.contains(event.relatedTarget))
      setOpen(false);
  };
  return (
    <div ref={root} className="relative flex max-md:flex-col" onBlur={leave}>
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
        ref={list}
        id={listId}
        hidden={!open}
        className="border-rule bg-sheet max-md:border-t md:absolute md:top-full md:right-0 md:z-30 md:min-w-52 md:border-2 md:border-ink md:py-1 md:shadow-float"
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
