import type { ReactNode } from "react";

interface EmptyProps {
  title: ReactNode;
  /** What will stand here, and what to do next. */
  children?: ReactNode;
  action?: ReactNode;
}

/** A place with nothing in it yet: says so, and what to do next. */
export function Empty({ title, children, action }: EmptyProps) {
  return (
    <div className="border-y border-rule py-10">
      <h2 className="text-xl">{title}</h2>
      {children !== undefined && <div className="mt-1 max-w-text text-iron">{children}</div>}
      {action !== undefined && <div className="mt-5">{action}</div>}
    </div>
  );
}
