import { useQuery } from "@tanstack/react-query";
import { useParams } from "react-router-dom";
import { ButtonLink } from "#web/components/button.tsx";
import { Empty } from "#web/components/empty.tsx";
import { PageHeading } from "#web/components/page-heading.tsx";
import { RequestFault } from "#web/components/request-fault.tsx";
import { Skeleton } from "#web/components/skeleton.tsx";
import { familyAddress } from "#web/features/build/build-address.ts";
import { FamilySheet } from "#web/features/families/family-sheet.tsx";
import { summariseFamilies } from "#web/features/families/family-summary.ts";
import { catalogueQuery } from "#web/lib/catalogue.ts";
import { queryClient } from "#web/lib/query-client.ts";

export function loader() {
  void queryClient.prefetchQuery(catalogueQuery);
  return null;
}

/** `/families/:family`: one family in full. */
export function Component() {
  const { family: id } = useParams();
  const { data, error, isFetching, refetch } = useQuery(catalogueQuery);
  if (data === undefined) {
    return error === null ? (
      <Skeleton lines={12} label="Loading the family" />
    ) : (
      <RequestFault error={error} retrying={isFetching} onRetry={() => void refetch()} />
    );
  }
  const summary = summariseFamilies(data).find(({ family }) => family.id === id);
  if (summary === undefined) {
    return (
      <div className="space-y-6">
        <PageHeading title="There is no such family" over="Blocks" />
        <Empty
          title={`${data.catalogue.families.length} families are made today`}
          action={<ButtonLink to="/families">See them all</ButtonLink>}
        >
          The address names a family that today&apos;s catalogue does not have.
        </Empty>
      </div>
    );
  }
  const { name } = summary.family;
  return (
    <div className="space-y-8">
      <PageHeading title={name} over="Blocks" />
      <FamilySheet
        current={data}
        summary={summary}
        action={
          <ButtonLink look="main" to={familyAddress(data.catalogue, summary.family.id)}>
            Start a build from {name}
          </ButtonLink>
        }
      />
    </div>
  );
}
