import { fireEvent, screen, waitFor, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, beforeEach, expect, it, vi } from "vitest";
import { lineId, orderReview } from "#tests/support/client-records.ts";
import { openShop, refuse, renderPage, type Shop } from "#tests/support/client.tsx";
import { DecisionForm } from "#web/features/orders/decision-form.tsx";
import { readQueueAddress } from "#web/features/orders/queries.ts";
import { ReviewView } from "#web/features/orders/review-view.tsx";

vi.setConfig({ testTimeout: 20_000 });

let shop: Shop;

beforeEach(async () => {
  shop = await openShop();
});

afterEach(() => shop.close());

function draw() {
  renderPage(<DecisionForm review={orderReview()}>{null}</DecisionForm>);
  return userEvent.setup({ delay: null });
}

const accept = "POST /api/orders/K7Q4-M2XD/accept";

it("asks for an answer to every special request and a reason for another date", async () => {
  const user = draw();
  fireEvent.change(screen.getByLabelText("Ships on, as promised"), { target: { value: "2027-03-01" } });
  await user.click(screen.getByRole("button", { name: "Accept and tell the customer" }));
  const summary = await screen.findByRole("group", { name: "2 things to mend" });
  expect(within(summary).getByRole("link", { name: /^Answer the special request/ })).toBeDefined();
  expect(within(summary).getByRole("link", { name: /^The date differs/ })).toBeDefined();
  expect(shop.bodies(accept)).toEqual([]);
});

it("accepts with the estimate and the answers", async () => {
  const user = draw();
  shop.answers[accept] = orderReview({ state: "accepted", promisedShipOn: "2027-01-22" });
  await user.type(screen.getByLabelText("Answer to the special request"), "Stamped.");
  await user.click(screen.getByRole("button", { name: "Accept and tell the customer" }));
  await waitFor(() => {
    expect(shop.bodies(accept)).toEqual([
      { promisedShipOn: "2027-01-22", dateReason: "", answers: { [lineId]: "Stamped." } },
    ]);
  });
});

it("keeps what was typed when the connection or the server fails", async () => {
  const user = draw();
  shop.answers[accept] = refuse(409, "conflict", "Somebody else has answered this order.");
  await user.type(screen.getByLabelText("Answer to the special request"), "Stamped.");
  await user.click(screen.getByRole("button", { name: "Accept and tell the customer" }));
  expect(await screen.findByText("Somebody else has answered this order.")).toBeDefined();
  expect(screen.getByLabelText<HTMLTextAreaElement>("Answer to the special request").value).toBe("Stamped.");
});

it("declines only with a reason", async () => {
  const user = draw();
  const decline = "POST /api/orders/K7Q4-M2XD/decline";
  shop.answers[decline] = orderReview({ state: "declined" });
  await user.click(screen.getByRole("button", { name: "Decline" }));
  const send = screen.getByRole("button", { name: "Decline and return $2,888.66" });
  await user.click(send);
  expect(await screen.findByRole("group", { name: "One thing to mend" })).toBeDefined();
  expect(shop.bodies(decline)).toEqual([]);
  await user.type(screen.getByLabelText("Reason"), "No casting of this height before summer.");
  await user.click(send);
  await waitFor(() => {
    expect(shop.bodies(decline)).toEqual([{ reason: "No casting of this height before summer." }]);
  });
});

it("gives those who may not decide no way to, and names who has the order open", () => {
  const openedBy = { name: "Theo Marsh", at: "2026-12-01T15:00:00.000Z", me: false };
  renderPage(<ReviewView review={orderReview({ openedBy })} timeZone="America/New_York" mayDecide={false} />);
  expect(screen.queryByRole("button", { name: /accept|decline/i })).toBeNull();
  expect(screen.getByText("Theo Marsh has this order open")).toBeDefined();
});

it.each([
  ["", { state: "placed", search: "", page: 1 }],
  ["state=declined&search=+K7Q4+&page=3", { state: "declined", search: "K7Q4", page: 3 }],
  ["state=awaiting-payment&page=-1", { state: "placed", search: "", page: 1 }],
  ["state=nonsense&page=two", { state: "placed", search: "", page: 1 }],
])("reads the queue's address %j", (address, expected) => {
  expect(readQueueAddress(new URLSearchParams(address))).toEqual(expected);
});
