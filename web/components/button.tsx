import { useEffect, type ComponentProps, type MouseEvent, type ReactNode } from "react";
import { Link } from "react-router-dom";
import { useAnnounce } from "./announcer.tsx";
import { classNames } from "./class-names.ts";

type Look = "main" | "secondary" | "quiet" | "danger";

const base =
  "inline-flex min-h-target items-center justify-center gap-2 rounded py-2 font-semibold leading-tight no-underline " +
  "transition-colors aria-disabled:cursor-not-allowed in-data-[place=floor]:min-h-target-floor";

const looks: Record<Look, string> = {
  main: "px-4 bg-pour text-on-pour hover:bg-pour-deep",
  secondary: "px-4 border border-edge bg-sheet text-ink hover:border-ink hover:bg-wash",
  quiet: "px-2 text-left text-dye underline decoration-1 underline-offset-4 hover:bg-dye-wash",
  danger: "px-4 bg-stop text-on-stop hover:bg-stop-deep",
};

interface ButtonProps extends Omit<ComponentProps<"button">, "disabled"> {
  /** main: the one main action of the screen. Default: secondary. */
  look?: Look;
  /** True while the work runs: the button keeps its focus and place, and further presses do nothing. */
  busy?: boolean;
  /** What the button says while busy, such as "Placing the order". */
  busyLabel?: string;
  /** Takes the whole width. */
  wide?: boolean;
  icon?: ReactNode;
}

/** A button that says what happens. `type` is "button" unless it is given. */
export function Button({
  look = "secondary",
  busy = false,
  busyLabel,
  wide = false,
  icon,
  type = "button",
  className,
  children,
  onClick,
  ...rest
}: ButtonProps) {
  const announce = useAnnounce();
  useEffect(() => {
    if (busy && busyLabel !== undefined) announce(busyLabel);
  }, [announce, busy, busyLabel]);
  const press = (event: MouseEvent<HTMLButtonElement>) => {
    if (busy) {
      event.preventDefault();
      event.stopPropagation();
      return;
    }
    onClick?.(event);
  };
  return (
    <button
      {...rest}
      type={type}
      aria-disabled={busy || rest["aria-disabled"]}
      aria-busy={busy || undefined}
      onClick={press}
      className={classNames(base, looks[look], wide && "w-full", className)}
    >
      {busy ? <BusyMark /> : icon}
      <span>{busy && busyLabel !== undefined ? busyLabel : children}</span>
    </button>
  );
}

function BusyMark() {
  return (
    <svg viewBox="0 0 20 20" className="size-4 shrink-0 animate-spin" aria-hidden="true">
      <circle cx="10" cy="10" r="8" fill="none" stroke="currentColor" strokeWidth="2" opacity="0.35" />
      <path d="M10 2a8 8 0 0 1 8 8" fill="none" stroke="currentColor" strokeWidth="2" />
    </svg>
  );
}

interface ButtonLinkProps extends ComponentProps<typeof Link> {
  look?: Look;
  wide?: boolean;
}

/** A link to another page that looks like a button. */
export function ButtonLink({ look = "secondary", wide = false, className, ...rest }: ButtonLinkProps) {
  return <Link {...rest} className={classNames(base, looks[look], wide && "w-full", className)} />;
}
