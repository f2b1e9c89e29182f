import { keepPreviousData, queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import type { Delivery } from "#shared/contracts/address.ts";
import { cartSchema } from "#shared/contracts/cart.ts";
import {
  checkoutResultSchema,
  placedOrderSchema,
  totalsSchema,
  type PlaceOrderRequest,
} from "#shared/contracts/checkout.ts";
import { api } from "#web/lib/api.ts";
import { ApiProblem } from "#web/lib/problems.ts";

/** The same cart that the cart page reads, under the same key. */
export const checkoutCartQuery = queryOptions({
  queryKey: ["cart"],
  queryFn: ({ signal }) => api.get("/api/cart", cartSchema, { signal }),
});

const totalsKey = ["checkout", "total"];

/** What the cart costs, delivered; asked once the delivery is complete. */
export function totalsQuery(delivery: Delivery | null) {
  return queryOptions({
    queryKey: [...totalsKey, delivery],
    enabled: delivery !== null,
    queryFn: ({ signal }) => api.post("/api/checkout/total", { delivery }, totalsSchema, { signal }),
    // The amounts of the address before stay in place, marked as old, while the new ones are asked for.
    placeholderData: keepPreviousData,
  });
}

/** Places the order and answers where to pay. */
export function usePlaceOrder() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (request: PlaceOrderRequest) => api.post("/api/orders", request, placedOrderSchema),
    onError: async (error) => {
      const outdated =
        error instanceof ApiProblem &&
        (error.is("price-changed") ||
          error.is("build-refused") ||
          error.is("conflict") ||
          error.is("payment-closed"));
      if (!outdated) return;
      await Promise.all([
        client.invalidateQueries({ queryKey: totalsKey }),
        client.invalidateQueries({ queryKey: checkoutCartQuery.queryKey }),
      ]);
    },
  });
}

const soon = 2_000;
const later = 10_000;
const patience = 30;

/** How the payment stands: asked every two seconds while it is waited for, after a minute every ten. */
export function checkoutResultQuery(session: string) {
  return queryOptions({
    queryKey: ["checkout", "result", session],
    queryFn: ({ signal }) =>
      api.get(`/api/checkout/result?session=${encodeURIComponent(session)}`, checkoutResultSchema, {
        signal,
      }),
    staleTime: 0,
    refetchInterval: (query) => {
      if (query.state.data?.state !== "waiting") return false;
      return query.state.dataUpdateCount < patience ? soon : later;
    },
  });
}
