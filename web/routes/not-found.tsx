import { ButtonLink } from "#web/components/button.tsx";
import { PageHeading } from "#web/components/page-heading.tsx";

/** No page at this address. */
export function NotFound() {
  return (
    <div className="space-y-8">
      <PageHeading
        title="There is no page at this address"
        lead="It may have been mistyped, or the link is older than the page. A build is kept whole in its own link: check that all of it was copied."
      />
      <div className="flex flex-wrap gap-3">
        <ButtonLink to="/" look="main">
          To the Counter
        </ButtonLink>
        <ButtonLink to="/build">Start a build</ButtonLink>
      </div>
    </div>
  );
}
