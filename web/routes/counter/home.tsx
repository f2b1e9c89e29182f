import { useQuery } from "@tanstack/react-query";
import { ButtonLink } from "#web/components/button.tsx";
import { DrawingFrame } from "#web/components/drawing-frame.tsx";
import { PageHeading } from "#web/components/page-heading.tsx";
import { RequestFault } from "#web/components/request-fault.tsx";
import { Skeleton } from "#web/components/skeleton.tsx";
import { TextLink } from "#web/components/text-link.tsx";
import { buildInProgress } from "#web/features/build/build-in-progress.ts";
import { SpecCodeField } from "#web/features/build/spec-code-field.tsx";
import { DeckFigure } from "#web/features/families/deck-figure.tsx";
import { summariseFamilies } from "#web/features/families/family-summary.ts";
import { FamilyTable } from "#web/features/families/family-table.tsx";
import { catalogueQuery } from "#web/lib/catalogue.ts";
import { queryClient } from "#web/lib/query-client.ts";

export function loader() {
  void queryClient.prefetchQuery(catalogueQuery);
  return null;
}

/** `/`: the front door. What the shop makes, and the ways in. */
export function Component() {
  const { data, error, isFetching, refetch } = useQuery(catalogueQuery);
  const earlier = buildInProgress();
  return (
    <div className="space-y-10">
      <div className="grid items-end gap-x-16 gap-y-8 lg:grid-cols-2">
        <div className="space-y-6">
          <PageHeading
            title="Bare V8 blocks, cast and machined to your build"
            lead="Choose the block step by step. Every answer is checked against the rest, with its price, weight and ship date beside it."
          />
          <div className="flex flex-wrap items-center gap-x-6 gap-y-3">
            <ButtonLink look="main" to="/build" className="text-lg">
              Start a build
            </ButtonLink>
            {earlier !== null && <TextLink to={earlier}>Go on with the build in progress</TextLink>}
          </div>
        </div>
        <SpecCodeField />
      </div>
      <DrawingFrame caption="Decks from above, bores at base size" remark="One scale; bore spacing in inches">
        <div className="min-h-40 px-3 sm:px-6">
          {data !== undefined && <DeckFigure families={data.catalogue.families} />}
        </div>
      </DrawingFrame>
      <section aria-labelledby="families">
        <div className="mb-2 flex flex-wrap items-baseline justify-between gap-x-6">
          <h2 id="families" className="text-2xl">
            The families
          </h2>
          <TextLink to="/families">Compare them in full</TextLink>
        </div>
        {data !== undefined ? (
          <FamilyTable families={summariseFamilies(data)} />
        ) : error !== null ? (
          <RequestFault error={error} retrying={isFetching} onRetry={() => void refetch()} />
        ) : (
          <Skeleton lines={4} label="Loading the families" />
        )}
      </section>
    </div>
  );
}
