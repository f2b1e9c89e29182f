/** The states that are shown by shape, word and colour together. */
export type StateKind = "stop" | "caution" | "note" | "pass" | "waiting";

const ink: Record<StateKind, string> = {
  stop: "text-stop",
  caution: "text-caution",
  note: "text-dye",
  pass: "text-pass",
  waiting: "text-iron",
};

interface StateMarkProps {
  kind: StateKind;
  className?: string;
}

/** Octagon, triangle, circle with a bar, tick in a square, open circle: told apart without colour. */
export function StateMark({ kind, className = "size-4" }: StateMarkProps) {
  return (
    <svg viewBox="0 0 16 16" aria-hidden="true" className={`${ink[kind]} ${className}`}>
      <MarkShape kind={kind} />
    </svg>
  );
}

function MarkShape({ kind }: { kind: StateKind }) {
  const line = { fill: "none", stroke: "var(--sheet)", strokeWidth: 2 };
  switch (kind) {
    case "stop":
      return (
        <>
          <path d="M5 .5h6L15.500 5v6L11 15.500H5L.5 11V5z" fill="currentColor" />
          <path d="M4 8h8" {...line} />
        </>
      );
    case "caution":
      return (
        <>
          <path d="M8 1 15.800 15H.2z" fill="currentColor" />
          <path d="M8 5.500v4.500M8 11.500v2" {...line} strokeWidth={1.75} />
        </>
      );
    case "note":
      return (
        <>
          <circle cx="8" cy="8" r="7.500" fill="currentColor" />
          <path d="M8 7v5M8 3.500v2" {...line} />
        </>
      );
    case "pass":
      return (
        <>
          <rect x=".5" y=".5" width="15" height="15" fill="currentColor" />
          <path d="m3.500 8.200 3 3 6-6.500" {...line} />
        </>
      );
    case "waiting":
      return <circle cx="8" cy="8" r="6.500" fill="none" stroke="currentColor" strokeWidth="2" />;
  }
}
