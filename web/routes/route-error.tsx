import { isRouteErrorResponse, useLocation, useRevalidator, useRouteError } from "react-router-dom";
import { ButtonLink } from "#web/components/button.tsx";
import { PageHeading } from "#web/components/page-heading.tsx";
import { RequestFault } from "#web/components/request-fault.tsx";
import { CounterFrame } from "#web/layouts/counter-layout.tsx";
import { ApiProblem, ConnectionProblem } from "#web/lib/problems.ts";
import { NotFound } from "./not-found.tsx";

/** What stands in a page's place when it cannot be shown. */
export function RouteError() {
  const error = useRouteError();
  const { revalidate, state } = useRevalidator();
  const { pathname, search } = useLocation();
  const missing = isRouteErrorResponse(error)
    ? error.status === 404
    : error instanceof ApiProblem && error.is("not-found");
  if (missing) return <NotFound />;
  const closed = error instanceof ApiProblem && error.is("not-allowed");
  const next = encodeURIComponent(pathname + search);
  const retry = () => {
    // A fault of the page itself, or a part of the program that did not load, needs the page anew.
    if (error instanceof ApiProblem || error instanceof ConnectionProblem) void revalidate();
    else window.location.reload();
  };
  return (
    <div className="space-y-8">
      <PageHeading title="This page cannot be shown" />
      <RequestFault
        error={error}
        onRetry={retry}
        retrying={state === "loading"}
        action={
          <>
            <ButtonLink to="/">To the Counter</ButtonLink>
            {closed && <ButtonLink to={`/account/sign-in?next=${next}`}>Sign in as somebody else</ButtonLink>}
          </>
        }
      />
    </div>
  );
}

/** The same, when the place itself could not be opened. */
export function PlaceError() {
  return (
    <CounterFrame>
      <RouteError />
    </CounterFrame>
  );
}
