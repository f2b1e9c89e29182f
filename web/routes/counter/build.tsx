import { useQuery } from "@tanstack/react-query";
import { Outlet } from "react-router-dom";
import { RequestFault } from "#web/components/request-fault.tsx";
import { Skeleton } from "#web/components/skeleton.tsx";
import { BuildGate } from "#web/features/build/build-gate.tsx";
import { catalogueQuery } from "#web/lib/catalogue.ts";
import { queryClient } from "#web/lib/query-client.ts";

export function loader() {
  void queryClient.prefetchQuery(catalogueQuery);
  return null;
}

/** A change of the build is a change of the address, and needs nothing of the server. */
export function shouldRevalidate() {
  return false;
}

/** `/build`: holds the build while its steps come and go. */
export function Component() {
  const { data, error, isFetching, refetch } = useQuery(catalogueQuery);
  if (data !== undefined) {
    return (
      <BuildGate current={data}>
        <Outlet />
      </BuildGate>
    );
  }
  if (error !== null) {
    return <RequestFault error={error} retrying={isFetching} onRetry={() => void refetch()} />;
  }
  return <Skeleton lines={10} label="Loading the catalogue" />;
}
