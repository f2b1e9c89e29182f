import { cleanup, screen, waitFor } from "@testing-library/react";
import { afterEach, beforeEach, expect, it, vi } from "vitest";
import { openShop, refuse, type Shop } from "#tests/support/client.tsx";
import { completed, current, openBuild, specOf } from "./build-pages.tsx";

vi.setConfig({ testTimeout: 40_000 });

let shop: Shop;

beforeEach(async () => {
  shop = await openShop();
  shop.answers["GET /api/catalogue"] = current;
});

afterEach(() => shop.close());

const put = "POST /api/cart/lines";
/** It stands in the strip for phones and beside the title block; either will do. */
function putButton(): HTMLElement {
  const [button] = screen.getAllByText("Put in the cart");
  if (button === undefined) throw new Error("there is no button to put the block in the cart");
  return button;
}

const answers = completed({ family: "marl", duty: "street", induction: "naturallyAspirated", bore: "b4125" });
const address = `/build/review?spec=${specOf(answers)}`;

it("leads to what is not answered yet", async () => {
  openBuild(`/build/review?spec=${specOf({ family: "marl" })}`);
  const link = await screen.findByRole<HTMLAnchorElement>("link", { name: "Bore" });
  expect(link.getAttribute("href")).toMatch(/^\/build\/bore-and-deck\?spec=.*#bore$/);
  expect(screen.queryByRole("button", { name: "Put in the cart" })).toBeNull();
});

it("puts the block in the cart with what was typed, once", async () => {
  const { router, user } = openBuild(address);
  shop.answers[put] = { lines: [], refused: [], totalCents: 0, blocks: 2 };
  await user.type(await screen.findByLabelText(/^Engraving/), "mox-7");
  await user.type(screen.getByLabelText(/^Special request/), "Leave the front face bare.");
  await user.clear(screen.getByLabelText("Blocks"));
  await user.type(screen.getByLabelText("Blocks"), "2");
  await waitFor(() => {
    expect(new URLSearchParams(router.state.location.search).get("engraving")).toBe("MOX-7");
  });
  await user.click(putButton());
  await screen.findByText("another page");
  expect(router.state.location.pathname).toBe("/cart");
  expect(shop.bodies(put)).toEqual([
    {
      specCode: specOf(answers),
      numbers: {},
      quantity: 2,
      engraving: "MOX-7",
      specialRequest: "Leave the front face bare.",
      expectedPriceCents: 292_500,
    },
  ]);
});

it("keeps a special request over a reload", async () => {
  const { user } = openBuild(address);
  await user.type(await screen.findByLabelText(/^Special request/), "Paint it grey.");
  cleanup();
  openBuild(address);
  expect((await screen.findByLabelText<HTMLTextAreaElement>(/^Special request/)).value).toBe(
    "Paint it grey.",
  );
});

it("shows the old and the new price and asks again when the price has changed", async () => {
  const { user } = openBuild(address);
  await screen.findByLabelText(/^Engraving/);
  shop.answers[put] = refuse(409, "price-changed", "This block is $2,985.00 today.");
  const dearer = { ...current.priceList, families: { ...current.priceList.families, marl: 300_000 } };
  shop.answers["GET /api/catalogue"] = { ...current, priceList: dearer };
  await user.click(putButton());
  const notice = (await screen.findByText("The price has changed")).closest("div");
  await waitFor(() => {
    expect(notice?.textContent).toContain("It was $2,925.00 and is now $2,985.00.");
  });
  shop.answers[put] = { lines: [], refused: [], totalCents: 0, blocks: 1 };
  await user.click(putButton());
  await screen.findByText("another page");
  expect(shop.bodies(put)).toMatchObject([{ expectedPriceCents: 292_500 }, { expectedPriceCents: 298_500 }]);
});

it("says why a build was refused and leads to the step", async () => {
  const { user } = openBuild(address);
  await screen.findByLabelText(/^Engraving/);
  shop.answers[put] = refuse(422, "build-refused", "It cannot be made.", {
    errors: [{ path: "answers.bore", message: "Bore is not answered." }],
  });
  await user.click(putButton());
  expect(await screen.findByText(/^Bore is not answered\./)).toBeDefined();
  expect(screen.getByRole("link", { name: "Change it" }).getAttribute("href")).toMatch(
    /^\/build\/bore-and-deck/,
  );
});

it("names what is wrong with the engraving and the quantity before anything is sent", async () => {
  const { user } = openBuild(address);
  await user.type(await screen.findByLabelText(/^Engraving/), "no/go");
  await user.clear(screen.getByLabelText("Blocks"));
  await user.type(screen.getByLabelText("Blocks"), "21");
  await user.click(putButton());
  const summary = await screen.findByRole("group", { name: "2 things to mend" });
  await waitFor(() => {
    expect(document.activeElement).toBe(summary);
  });
  expect(shop.bodies(put)).toEqual([]);
});
