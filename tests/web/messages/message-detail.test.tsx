import { screen, waitFor } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, beforeEach, expect, it } from "vitest";
import { openShop, refuse, renderPage, type Shop } from "#tests/support/client.tsx";
import { MessageDetail } from "#web/features/messages/message-detail.tsx";
import type { MessageView } from "#shared/contracts/messages.ts";

const message: MessageView = {
  id: "5f0c6a52-8a31-4d0e-9f4c-0d5c2f4f7a10",
  kind: "order-placed",
  to: "dana@example.com",
  subject: "Receipt",
  state: "waiting",
  createdAt: "2026-12-01T15:00:00.000Z",
  sentAt: null,
  attempts: 3,
  lastError: "the mail server closed the connection",
  orderNumber: "K7Q4-M2XD",
  text: "Good day",
};
const again = `POST /api/messages/${message.id}/send-again`;

let shop: Shop;
beforeEach(async () => {
  shop = await openShop();
});
afterEach(() => shop.close());

it("shows why a message is held up and sends it again", async () => {
  shop.answers[again] = message;
  renderPage(<MessageDetail message={message} timeZone="America/New_York" />);
  expect(screen.getByText("Held up")).toBeDefined();
  expect(screen.getByText("the mail server closed the connection")).toBeDefined();
  await userEvent.click(screen.getByRole("button", { name: "Send again" }));
  expect(await screen.findByText("On its way again")).toBeDefined();
  expect(shop.bodies(again)).toHaveLength(1);
});

it("says so when it cannot be sent again", async () => {
  shop.answers[again] = refuse(409, "conflict", "It is being sent right now.");
  renderPage(<MessageDetail message={message} timeZone="America/New_York" />);
  await userEvent.click(screen.getByRole("button", { name: "Send again" }));
  await waitFor(() => {
    expect(screen.getByText("It is being sent right now.")).toBeDefined();
  });
});
