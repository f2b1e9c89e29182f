import { queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import {
  cartSchema,
  type AddCartLineRequest,
  type CartLineView,
  type CartView,
} from "#shared/contracts/cart.ts";
import { api } from "#web/lib/api.ts";
import { useRefreshSession } from "#web/lib/session.ts";

export const cartQuery = queryOptions({
  queryKey: ["cart"],
  queryFn: ({ signal }) => api.get("/api/cart", cartSchema, { signal }),
});

/** Every change answers with the whole cart; the count in the header follows. */
function useCartMutation<Request>(send: (request: Request) => Promise<CartView>) {
  const client = useQueryClient();
  const refreshSession = useRefreshSession();
  return useMutation({
    mutationFn: async (request: Request) => {
      await client.cancelQueries({ queryKey: cartQuery.queryKey });
      return send(request);
    },
    // One change after the other, so that an answer never shows the cart of a moment before.
    scope: { id: "cart" },
    onSuccess: (cart) => {
      client.setQueryData(cartQuery.queryKey, cart);
      void refreshSession();
    },
    onError: () => client.invalidateQueries({ queryKey: cartQuery.queryKey }),
  });
}

export function useChangeQuantity() {
  return useCartMutation(({ id, quantity }: { id: string; quantity: number }) =>
    api.patch(`/api/cart/lines/${id}`, { quantity }, cartSchema),
  );
}

export function useRemoveLine() {
  return useCartMutation((id: string) => api.delete(`/api/cart/lines/${id}`, cartSchema));
}

/** Puts a line that was taken out back in, at the price it had in the cart a moment ago. */
export function usePutBack() {
  return useCartMutation((line: CartLineView) => {
    const request: AddCartLineRequest = {
      specCode: line.build.specCode,
      numbers: line.build.numbers,
      quantity: line.quantity,
      engraving: line.engraving,
      specialRequest: line.specialRequest,
      expectedPriceCents: line.build.priceCents,
    };
    return api.post("/api/cart/lines", request, cartSchema);
  });
}
