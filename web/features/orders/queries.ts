import { keepPreviousData, queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import { acknowledgementSchema } from "#shared/contracts/account.ts";
import {
  myOrdersSchema,
  orderListQuerySchema,
  orderListSchema,
  orderReviewSchema,
  orderSchema,
  type AcceptOrderRequest,
  type DeclineOrderRequest,
  type OrderListQuery,
  type OrderReview,
} from "#shared/contracts/orders.ts";
import { api, nothing } from "#web/lib/api.ts";

const path = (number: string) => `/api/orders/${encodeURIComponent(number)}`;

/** An order as its buyer sees it. */
export function orderQuery(number: string) {
  return queryOptions({
    queryKey: ["orders", "one", number],
    queryFn: ({ signal }) => api.get(path(number), orderSchema, { signal }),
  });
}

export const myOrdersQuery = queryOptions({
  queryKey: ["orders", "mine"],
  queryFn: ({ signal }) => api.get("/api/account/orders", myOrdersSchema, { signal }),
});

/** Sends a new link to an order, when number and e-mail belong together; the answer is the same when they do not. */
export function useSendOrderLink() {
  return useMutation({
    mutationFn: (request: { orderNumber: string; email: string }) =>
      api.post("/api/orders/links", request, acknowledgementSchema),
  });
}

/** What the address bar of the queue asks for; what cannot be read falls back to its default. */
export function readQueueAddress(search: URLSearchParams): OrderListQuery {
  const { state, search: words, page } = orderListQuerySchema.shape;
  return {
    state: state.catch("placed").parse(search.get("state") ?? undefined),
    search: words.catch("").parse(search.get("search") ?? undefined),
    page: page.catch(1).parse(search.get("page") ?? undefined),
  };
}

/** The shop's queue, looked at again every half minute. */
export function orderListQuery(query: OrderListQuery) {
  const search = new URLSearchParams({
    state: query.state,
    search: query.search,
    page: String(query.page),
  });
  return queryOptions({
    queryKey: ["orders", "list", query],
    queryFn: ({ signal }) => api.get(`/api/orders?${search.toString()}`, orderListSchema, { signal }),
    placeholderData: keepPreviousData,
    refetchInterval: 30_000,
  });
}

/** An order as the shop sees it. */
export function orderReviewQuery(number: string) {
  return queryOptions({
    queryKey: ["orders", "review", number],
    queryFn: ({ signal }) => api.get(`${path(number)}/review`, orderReviewSchema, { signal }),
  });
}

/** Tells the others that somebody has the order open. */
export function openOrder(number: string): Promise<OrderReview> {
  return api.post(`${path(number)}/open`, undefined, orderReviewSchema);
}

export function closeOrder(number: string): Promise<undefined> {
  return api.post(`${path(number)}/close`, undefined, nothing);
}

function useDecision<Request>(number: string, decision: "accept" | "decline") {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (request: Request) => api.post(`${path(number)}/${decision}`, request, orderReviewSchema),
    onSuccess: (review) => {
      client.setQueryData(orderReviewQuery(number).queryKey, review);
      void client.invalidateQueries({ queryKey: ["orders", "list"] });
    },
    // Somebody else may have decided, or the estimate moved: what is shown is read anew.
    onError: () => client.invalidateQueries({ queryKey: orderReviewQuery(number).queryKey }),
  });
}

export function useAcceptOrder(number: string) {
  return useDecision<AcceptOrderRequest>(number, "accept");
}

export function useDeclineOrder(number: string) {
  return useDecision<DeclineOrderRequest>(number, "decline");
}
