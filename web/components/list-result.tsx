import type { UseQueryResult } from "@tanstack/react-query";
import type { ReactNode } from "react";
import { Notice } from "./notice.tsx";
import { Pager } from "./pager.tsx";
import { RequestFault } from "./request-fault.tsx";
import { Skeleton } from "./skeleton.tsx";

interface ListResultProps<Page> {
  list: UseQueryResult<Page>;
  /** What is listed, in the plural: "orders". */
  things: string;
  /** Draws the page's table. */
  children: (page: Page) => ReactNode;
}

/** A page of a list that is asked from the server: while it comes, when it came, and when it did not. */
export function ListResult<Page extends { page: number; pages: number }>({
  list,
  things,
  children,
}: ListResultProps<Page>) {
  const { data } = list;
  if (data === undefined) {
    return list.isError ? (
      <RequestFault error={list.error} onRetry={() => void list.refetch()} retrying={list.isFetching} />
    ) : (
      <Skeleton lines={8} label={`Reading the ${things}`} />
    );
  }
  return (
    <>
      {list.isError && (
        <Notice kind="caution" title="This list may be out of date">
          The shop's server could not be reached just now. The list is asked for again by itself.
        </Notice>
      )}
      <div className={list.isPlaceholderData ? "opacity-60" : undefined}>{children(data)}</div>
      <Pager page={data.page} pages={data.pages} label={`Pages of ${things}`} />
    </>
  );
}
