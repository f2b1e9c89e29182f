import { cleanup, screen, waitFor, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, beforeEach, expect, it, vi } from "vitest";
import { cartView, sessionView, totals } from "#tests/support/client-records.ts";
import { openShop, refuse, renderPage, type Shop } from "#tests/support/client.tsx";
import { CheckoutForm } from "#web/features/checkout/checkout-form.tsx";

// Many fields are typed key by key.
vi.setConfig({ testTimeout: 20_000 });

let shop: Shop;
const pay = vi.fn();

beforeEach(async () => {
  shop = await openShop();
  shop.answers["GET /api/session"] = sessionView();
  shop.answers["POST /api/checkout/total"] = totals();
});

afterEach(async () => {
  pay.mockReset();
  await shop.close();
});

function draw() {
  renderPage(<CheckoutForm cart={cartView()} person={null} onPay={pay} />);
  return userEvent.setup({ delay: null });
}

async function fill(user: ReturnType<typeof userEvent.setup>) {
  await user.type(screen.getByLabelText("Name"), "Dana Whitlock");
  await user.type(screen.getByLabelText("E-mail"), "dana@example.com");
  await user.type(screen.getByLabelText("Telephone"), "(313) 555-0123");
  await user.type(screen.getByLabelText("Street and number"), "2210 Quarry Road");
  await user.type(screen.getByLabelText("City"), "Toledo");
  await user.selectOptions(screen.getByLabelText("State"), "OH");
  await user.type(screen.getByLabelText("ZIP code"), "43604");
}

const payButton = () => screen.findByRole("button", { name: "Pay $2,888.66" });

it("lists what is wrong, takes focus there and leads to the field", async () => {
  const user = draw();
  await user.click(screen.getByRole("button", { name: "Pay" }));
  const summary = await screen.findByRole("group", { name: "7 things to mend" });
  await waitFor(() => {
    expect(document.activeElement).toBe(summary);
  });
  await user.click(within(summary).getByRole("link", { name: "Write the city." }));
  expect(document.activeElement).toBe(screen.getByLabelText("City"));
  expect(shop.bodies("POST /api/orders")).toEqual([]);
});

it("shows freight, tax and the total once the address is complete, and asks no address for a pick-up", async () => {
  const user = draw();
  expect(screen.getByText("Known once the address is complete")).toBeDefined();
  await fill(user);
  await payButton();
  expect(screen.getByText("Freight to OH 43604")).toBeDefined();
  await user.click(screen.getByLabelText(/Picked up at the shop/));
  expect(screen.queryByLabelText("ZIP code")).toBeNull();
  await waitFor(() => {
    expect(shop.bodies("POST /api/checkout/total").at(-1)).toEqual({ delivery: { method: "pick-up" } });
  });
});

it("sends the total that was seen, is busy until the payment page opens and cannot be sent twice", async () => {
  const user = draw();
  await fill(user);
  let answer: (value: unknown) => void = () => undefined;
  shop.answers["POST /api/orders"] = new Promise((resolve) => {
    answer = resolve;
  });
  await user.click(await payButton());
  const busy = await screen.findByRole("button", { name: "Placing the order" });
  await user.click(busy);
  await user.type(screen.getByLabelText("City"), "{Enter}");
  answer({ orderNumber: "K7Q4-M2XD", paymentUrl: "https://pay.example/1" });
  await waitFor(() => {
    expect(pay).toHaveBeenCalledExactlyOnceWith("https://pay.example/1");
  });
  expect(shop.bodies("POST /api/orders")).toEqual([
    {
      contact: { name: "Dana Whitlock", email: "dana@example.com", phone: "+13135550123" },
      delivery: {
        method: "freight",
        address: {
          line1: "2210 Quarry Road",
          line2: "",
          city: "Toledo",
          state: "OH",
          postalCode: "43604",
          country: "US",
        },
      },
      expectedTotalCents: 288_866,
    },
  ]);
});

it("shows the new total when the price changed, and asks again", async () => {
  const user = draw();
  await fill(user);
  await payButton();
  shop.answers["POST /api/orders"] = refuse(409, "price-changed", "The total is another.");
  shop.answers["POST /api/checkout/total"] = totals(20_000);
  shop.answers["GET /api/cart"] = cartView();
  await user.click(await payButton());
  expect(await screen.findByText(/It was \$2,888\.66\. The new total stands above/)).toBeDefined();
  expect(await screen.findByRole("button", { name: "Pay $2,946.00" })).toBeDefined();
  expect(pay).not.toHaveBeenCalled();
});

it("says that a cart was paid already and leads to its order", async () => {
  const user = draw();
  await fill(user);
  shop.answers["POST /api/orders"] = refuse(409, "payment-closed", "Paid already.", {
    orderNumber: "K7Q4-M2XD",
  });
  await user.click(await payButton());
  const link = await screen.findByRole("link", { name: "Open order K7Q4-M2XD" });
  expect(link.getAttribute("href")).toBe("/orders/K7Q4-M2XD");
});

it("puts what the server refuses on its field", async () => {
  const user = draw();
  await fill(user);
  shop.answers["POST /api/orders"] = refuse(422, "validation", "Not like this.", {
    errors: [{ path: "delivery.address.postalCode", message: "No carrier goes there." }],
  });
  await user.click(await payButton());
  const summary = await screen.findByRole("group", { name: "One thing to mend" });
  expect(within(summary).getByRole("link", { name: "No carrier goes there." })).toBeDefined();
  expect(screen.getByLabelText("ZIP code").getAttribute("aria-invalid")).toBe("true");
});

it("keeps what was typed over a reload", async () => {
  const user = draw();
  await user.type(screen.getByLabelText("Name"), "Dana Whitlock");
  await user.type(screen.getByLabelText("City"), "Toledo");
  cleanup();
  draw();
  expect(screen.getByLabelText<HTMLInputElement>("Name").value).toBe("Dana Whitlock");
  expect(screen.getByLabelText<HTMLInputElement>("City").value).toBe("Toledo");
});
