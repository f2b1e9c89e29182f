import type { ComponentProps } from "react";
import { Link } from "react-router-dom";
import { classNames } from "./class-names.ts";

const look = "text-dye underline decoration-1 underline-offset-[0.2em] hover:decoration-2";

/** A link inside the program. */
export function TextLink({ className, ...rest }: ComponentProps<typeof Link>) {
  return <Link {...rest} className={classNames(look, className)} />;
}

interface OutsideLinkProps extends ComponentProps<"a"> {
  href: string;
}

/** A link that leaves the program: mail, telephone, another site. */
export function OutsideLink({ className, children, ...rest }: OutsideLinkProps) {
  return (
    <a {...rest} className={classNames(look, className)}>
      {children}
    </a>
  );
}
