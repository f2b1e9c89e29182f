import { screen, waitFor, within } from "@testing-library/react";
import { afterEach, beforeEach, expect, it, vi } from "vitest";
import { openShop, type Shop } from "#tests/support/client.tsx";
import { current, openBuild, specOf } from "./build-pages.tsx";

vi.setConfig({ testTimeout: 40_000 });

let shop: Shop;

beforeEach(async () => {
  shop = await openShop();
  shop.answers["GET /api/catalogue"] = current;
});

afterEach(() => shop.close());

type Router = ReturnType<typeof openBuild>["router"];
const typedIn = (router: Router, id: string) =>
  new URLSearchParams(router.state.location.search).get(`n.${id}`);
const box = (within: { findByRole: typeof screen.findByRole }, name: RegExp) =>
  within.findByRole<HTMLInputElement>("textbox", { name });

it("asks for own numbers under the rotating assembly, only with own numbers, and keeps them when they are not read", async () => {
  const { router, user } = openBuild(`/build/rotating-assembly?spec=${specOf({ family: "marl" })}`);
  await screen.findByRole("group", { name: "Piston crown" });
  expect(screen.queryByRole("group", { name: "Your rotating assembly" })).toBeNull();
  await user.click(await screen.findByLabelText(/^Own numbers, steel rods/));
  const group = await screen.findByRole("group", { name: "Your rotating assembly" });
  expect(within(group).getAllByRole("textbox")).toHaveLength(7);
  expect(group.textContent).toContain("Unknown is an answer");
  const crown = screen.getByRole("group", { name: "Piston crown" });
  expect(group.compareDocumentPosition(crown) & Node.DOCUMENT_POSITION_FOLLOWING).not.toBe(0);
  await user.type(await box(within(group), /^Stroke/), "3.75{Enter}");
  await waitFor(() => {
    expect(typedIn(router, "stroke")).toBe("3.75");
  });
  await router.navigate(-1);
  await user.click(await screen.findByLabelText(/^Not known yet/));
  expect(screen.queryByRole("group", { name: "Your rotating assembly" })).toBeNull();
  await waitFor(() => {
    expect(typedIn(router, "stroke")).toBe("3.75");
  });
});

it("asks for eight skirts and the clearance only when the block is honed to them, and refuses one that is off", async () => {
  const spec = specOf({ family: "marl", bore: "b4125" });
  const { router, user } = openBuild(`/build/bore-and-deck?spec=${spec}`);
  await user.click(await screen.findByLabelText(/^Honed to my pistons/));
  const group = await screen.findByRole("group", { name: "Your pistons, measured" });
  expect(within(group).getAllByRole("textbox")).toHaveLength(9);
  await user.type(await box(within(group), /^Clearance asked/), ".0045");
  await user.tab();
  await waitFor(() => {
    expect(typedIn(router, "pistonClearance")).toBe("0.0045");
  });
  const skirt = await box(within(group), /^Skirt, piston 3/);
  await user.type(skirt, "4.1105");
  await user.tab();
  expect(skirt.getAttribute("aria-invalid")).toBe("true");
  expect(group.textContent).toMatch(/within 0\.0025 in of the bore chosen.*Set by/);
  expect(
    within(group).getByRole("button", { name: /^Also change bore finish to rough bored/ }),
  ).toBeDefined();
  expect(typedIn(router, "skirt3")).toBeNull();
  await user.clear(skirt);
  await user.type(skirt, "4.12050");
  await user.tab();
  await waitFor(() => {
    expect(typedIn(router, "skirt3")).toBe("4.1205");
  });
});

it("takes a dome with a minus sign, a shot only with nitrous, and shows numbers that are read in the review", async () => {
  const { router, user } = openBuild(`/build/rotating-assembly?spec=${specOf({ family: "marl" })}`);
  await user.type(await box(screen, /^Piston dish/), "−4.5{Enter}");
  await waitFor(() => {
    expect(typedIn(router, "dish")).toBe("-4.5");
  });
  await router.navigate(`/build/duty${router.state.location.search}`);
  expect(screen.queryByRole("textbox", { name: /^Nitrous shot/ })).toBeNull();
  await user.click(await screen.findByLabelText(/^Nitrous/));
  await user.type(await box(screen, /^Nitrous shot/), "100{Enter}");
  await waitFor(() => {
    expect(typedIn(router, "nitrousShot")).toBe("100");
  });
  await router.navigate(`/build/review${router.state.location.search}`);
  expect(await screen.findByText("100 hp")).toBeDefined();
  expect(screen.getByText("-4.5 cc")).toBeDefined();
  expect(screen.queryByText("Stroke")).toBeNull();
});
