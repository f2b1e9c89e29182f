import { useEffect, useId, useRef, type ReactNode } from "react";

interface DialogProps {
  open: boolean;
  title: ReactNode;
  /** Escape, or a press outside when `closesOutside`. */
  onClose: () => void;
  children: ReactNode;
  /** Buttons, the main one last. */
  actions?: ReactNode;
}

/**
 * A modal question. The browser's own dialog element keeps focus inside, makes the page behind inert,
 * closes on Escape and gives focus back.
 */
export function Dialog({ open, title, onClose, children, actions }: DialogProps) {
  const box = useRef<HTMLDialogElement>(null);
  const titleId = useId();
  useEffect(() => {
    const dialog = box.current;
    if (dialog === null) return;
    if (open && !dialog.open) dialog.showModal();
    if (!open && dialog.open) dialog.close();
  }, [open]);
  return (
    <dialog
      ref={box}
      aria-labelledby={titleId}
      onClose={onClose}
      className="m-auto w-[min(36rem,calc(100vw-2rem))] rounded border-2 border-ink bg-sheet p-0 text-ink shadow-float backdrop:bg-shade"
    >
      {open && (
        <div className="p-5 sm:p-6">
          <h2 id={titleId} className="text-xl">
            {title}
          </h2>
          <div className="mt-3 space-y-4">{children}</div>
          {actions !== undefined && <div className="mt-6 flex flex-wrap justify-end gap-3">{actions}</div>}
        </div>
      )}
    </dialog>
  );
}
