import { useMutation, useQueryClient } from "@tanstack/react-query";
import { addCartLineRequestSchema, cartSchema, type AddCartLineRequest } from "#shared/contracts/cart.ts";
import { api } from "#web/lib/api.ts";
import { useRefreshSession } from "#web/lib/session.ts";

/** The part of the request that is typed at the review. */
export const cartFieldsSchema = addCartLineRequestSchema.pick({
  engraving: true,
  specialRequest: true,
  quantity: true,
});

/** Sends one line for the cart; the header's count and the cart's page then read it anew. */
export function usePutInCart() {
  const client = useQueryClient();
  const refreshSession = useRefreshSession();
  return useMutation({
    mutationFn: (line: AddCartLineRequest) => api.post("/api/cart/lines", line, cartSchema),
    onSuccess: async (cart) => {
      client.setQueryData(["cart"], cart);
      await refreshSession();
    },
  });
}
