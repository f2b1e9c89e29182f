interface SkeletonProps {
  /** Lines of text to keep the place of; a line is 24 px. */
  lines?: number;
  /** Said to those who listen. */
  label?: string;
}

/** Keeps the place of what is loading, at the same size. */
export function Skeleton({ lines = 6, label = "Loading" }: SkeletonProps) {
  return (
    <div role="status" className="animate-pulse">
      <span className="sr-only">{label}</span>
      {Array.from({ length: lines }, (_, line) => (
        <div key={line} className="flex h-12 items-center border-b border-rule">
          <div className={`h-3 rounded bg-wash ${["w-3/5", "w-4/5", "w-2/5"][line % 3] ?? ""}`} />
        </div>
      ))}
    </div>
  );
}
