import { useQuery } from "@tanstack/react-query";
import { ButtonLink } from "#web/components/button.tsx";
import { PageHeading } from "#web/components/page-heading.tsx";
import { RequestFault } from "#web/components/request-fault.tsx";
import { Skeleton } from "#web/components/skeleton.tsx";
import { TextLink } from "#web/components/text-link.tsx";
import { familyAddress } from "#web/features/build/build-address.ts";
import { FamilyComparison } from "#web/features/families/family-comparison.tsx";
import { summariseFamilies } from "#web/features/families/family-summary.ts";
import { catalogueQuery } from "#web/lib/catalogue.ts";
import { queryClient } from "#web/lib/query-client.ts";

export function loader() {
  void queryClient.prefetchQuery(catalogueQuery);
  return null;
}

/** `/families`: the families side by side. */
export function Component() {
  const { data, error, isFetching, refetch } = useQuery(catalogueQuery);
  return (
    <div className="space-y-8">
      <PageHeading
        title="Blocks"
        lead="Where the families differ comes first. Prices are for the least costly option of every choice, without freight and tax."
      />
      {data !== undefined ? (
        <FamilyComparison
          current={data}
          families={summariseFamilies(data)}
          action={(id) => {
            const name = data.catalogue.families.find((family) => family.id === id)?.name ?? id;
            return (
              <span className="flex flex-wrap items-center gap-x-4 gap-y-2">
                <ButtonLink to={familyAddress(data.catalogue, id)}>Start a build from {name}</ButtonLink>
                <TextLink to={`/families/${id}`} className="inline-flex min-h-6 items-center">
                  About {name}
                </TextLink>
              </span>
            );
          }}
        />
      ) : error !== null ? (
        <RequestFault error={error} retrying={isFetching} onRetry={() => void refetch()} />
      ) : (
        <Skeleton lines={12} label="Loading the families" />
      )}
    </div>
  );
}
