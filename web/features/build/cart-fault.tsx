import { ErrorPanel } from "#web/components/error-panel.tsx";
import { Notice } from "#web/components/notice.tsx";
import { RequestFault } from "#web/components/request-fault.tsx";
import { TextLink } from "#web/components/text-link.tsx";
import { money } from "#web/lib/format.ts";
import { ApiProblem } from "#web/lib/problems.ts";
import { stepPath } from "./build-address.ts";
import { useBuildDesk } from "./build-desk.tsx";
import { stepOf } from "./what-is-missing.tsx";

interface CartFaultProps {
  error: unknown;
  /** The price that was on the screen when it was sent. */
  sentCents: number | null;
}

/** Why the block was not put in the cart: another price, a build that cannot be made, or a request that failed. */
export function CartFault({ error, sentCents }: CartFaultProps) {
  const { evaluation } = useBuildDesk();
  if (!(error instanceof ApiProblem)) return <RequestFault error={error} />;
  if (error.is("price-changed")) {
    const now = evaluation.price?.totalCents ?? null;
    const told = sentCents !== null && now !== null && now !== sentCents;
    return (
      <Notice kind="caution" title="The price has changed" live>
        {told ? (
          <p>
            It was <s>{money(sentCents)}</s> and is now <strong>{money(now)}</strong>. Nothing is in the cart
            yet. Press the button again if you agree.
          </p>
        ) : (
          <p>{error.message}</p>
        )}
      </Notice>
    );
  }
  if (error.is("build-refused")) return <RefusedBuild error={error} />;
  return <RequestFault error={error} />;
}

function RefusedBuild({ error }: { error: ApiProblem }) {
  const { current, evaluation, search } = useBuildDesk();
  const { steps } = current.catalogue;
  const stepFor = (path: string): string => {
    const name = path.split(".").slice(1).join(".");
    const byRule = evaluation.findings.find(({ rule }) => rule === name)?.step;
    const byNumber = steps.find(({ numbers }) => numbers.includes(name))?.id;
    return byRule ?? byNumber ?? stepOf(name, steps);
  };
  return (
    <ErrorPanel title={error.problem.title} safe="Nothing was put in the cart; the build is kept.">
      {error.problem.errors === undefined ? (
        <p>{error.message}</p>
      ) : (
        <ul>
          {error.problem.errors.map(({ path, message }) => (
            <li key={`${path} ${message}`}>
              {message}{" "}
              <TextLink to={{ pathname: stepPath(stepFor(path)), search }} className="inline-block py-0.5">
                Change it
              </TextLink>
            </li>
          ))}
        </ul>
      )}
    </ErrorPanel>
  );
}
