import { useQuery } from "@tanstack/react-query";
import { screen, waitFor } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, beforeEach, expect, it } from "vitest";
import { buildView, cartView, lineId, sessionView } from "#tests/support/client-records.ts";
import { openShop, renderPage, type Shop } from "#tests/support/client.tsx";
import { CartContents } from "#web/features/cart/cart-contents.tsx";
import { cartQuery } from "#web/features/cart/queries.ts";

let shop: Shop;
const nothingLeft = { lines: [], refused: [], totalCents: 0, blocks: 0 };

beforeEach(async () => {
  shop = await openShop();
  shop.answers["GET /api/session"] = sessionView();
});

afterEach(() => shop.close());

function Page() {
  const cart = useQuery(cartQuery).data;
  return cart === undefined ? null : <CartContents cart={cart} />;
}

it("changes the quantity by button and by typing, never past its limits", async () => {
  const user = userEvent.setup({ delay: null });
  shop.answers["GET /api/cart"] = cartView();
  shop.answers[`PATCH /api/cart/lines/${lineId}`] = cartView({ quantity: 2, totalCents: 496_200 });
  renderPage(<Page />);
  await user.click(await screen.findByRole("button", { name: /^One fewer/ }));
  await user.click(screen.getByRole("button", { name: /^One more/ }));
  expect(await screen.findByText("2 blocks at $2,481.00")).toBeDefined();
  const typed = screen.getByRole("textbox", { name: /^Blocks of/ });
  await user.clear(typed);
  await user.type(typed, "99{Enter}");
  await waitFor(() => {
    expect(shop.bodies(`PATCH /api/cart/lines/${lineId}`)).toEqual([{ quantity: 2 }, { quantity: 20 }]);
  });
});

it("takes a line out and puts it back as it was", async () => {
  const user = userEvent.setup({ delay: null });
  shop.answers["GET /api/cart"] = cartView({
    engraving: "WHITLOCK 27",
    specialRequest: "Stamp my initials.",
  });
  shop.answers[`DELETE /api/cart/lines/${lineId}`] = nothingLeft;
  shop.answers["POST /api/cart/lines"] = cartView();
  renderPage(<Page />);
  await user.click(await screen.findByRole("button", { name: /^Remove/ }));
  expect(await screen.findByRole("heading", { name: "There is no block in the cart" })).toBeDefined();
  await user.click(screen.getByRole("button", { name: "Put it back" }));
  expect(await screen.findByRole("link", { name: "Check out" })).toBeDefined();
  expect(shop.bodies("POST /api/cart/lines")).toEqual([
    {
      specCode: "0104-TEST",
      numbers: { powerAim: "450" },
      quantity: 1,
      engraving: "WHITLOCK 27",
      specialRequest: "Stamp my initials.",
      expectedPriceCents: 248_100,
    },
  ]);
});

it("tells a changed price, and leads back to the build with numbers and engraving", async () => {
  shop.answers["GET /api/cart"] = cartView({ earlierPriceCents: 240_000, engraving: "W 27" });
  renderPage(<Page />);
  expect(await screen.findByText(/It was \$2,400\.00 for one block; today it is \$2,481\.00/)).toBeDefined();
  const link = screen.getByRole("link", { name: buildView().specCode });
  expect(link.getAttribute("href")).toBe("/build/review?spec=0104-TEST&n.powerAim=450&engraving=W+27");
});

it("keeps from the checkout while a build cannot be made", async () => {
  shop.answers["GET /api/cart"] = {
    ...cartView(),
    refused: [
      { id: "1f0c6a52-8a31-4d0e-9f4c-0d5c2f4f7a10", specCode: "0104-OLD", reason: "No longer cast." },
    ],
  };
  renderPage(<Page />);
  expect(await screen.findByText("No longer cast.")).toBeDefined();
  expect(screen.queryByRole("link", { name: "Check out" })).toBeNull();
  expect(screen.getByRole("link", { name: "Open the build" }).getAttribute("href")).toBe(
    "/build/review?spec=0104-OLD",
  );
});
