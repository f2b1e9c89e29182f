import type { ReactNode } from "react";
import { ApiProblem, problemWords } from "#web/lib/problems.ts";
import { ButtonLink } from "./button.tsx";
import { ErrorPanel } from "./error-panel.tsx";

interface RequestFaultProps {
  error: unknown;
  onRetry?: (() => void) | undefined;
  retrying?: boolean;
  action?: ReactNode;
}

/** The error panel for a request that failed: a query's `error` with its `refetch`. */
export function RequestFault({ error, onRetry, retrying = false, action }: RequestFaultProps) {
  const words = problemWords(error);
  const signedOut = error instanceof ApiProblem && error.status === 401;
  const next = encodeURIComponent(window.location.pathname + window.location.search);
  return (
    <ErrorPanel
      title={words.title}
      safe={words.safe}
      onRetry={words.again ? onRetry : undefined}
      retrying={retrying}
      action={signedOut ? <ButtonLink to={`/account/sign-in?next=${next}`}>Sign in</ButtonLink> : action}
    >
      {words.detail !== null && <p>{words.detail}</p>}
    </ErrorPanel>
  );
}
