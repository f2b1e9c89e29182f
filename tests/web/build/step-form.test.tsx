import { cleanup, screen, waitFor, within } from "@testing-library/react";
import { afterEach, beforeEach, expect, it, vi } from "vitest";
import { demoCatalogue } from "#server/demo/catalogue/catalogue.ts";
import { searchToBuild } from "#shared/catalogue/build-address.ts";
import { openShop, type Shop } from "#tests/support/client.tsx";
import { completed, current, openBuild, specOf } from "./build-pages.tsx";

vi.setConfig({ testTimeout: 40_000 });

let shop: Shop;

beforeEach(async () => {
  shop = await openShop();
  shop.answers["GET /api/catalogue"] = current;
});

afterEach(() => shop.close());

type Router = ReturnType<typeof openBuild>["router"];

function answersIn(router: Router): Record<string, string> {
  const { search } = router.state.location;
  return searchToBuild(demoCatalogue, new URLSearchParams(search)).build.answers;
}

const radio = (label: RegExp) => screen.findByLabelText<HTMLInputElement>(label);

it("starts at the first step, takes choices into the address and goes on by Enter", async () => {
  const { router, user } = openBuild("/build");
  await user.click(await radio(/^Drag/));
  expect((await radio(/^Drag/)).checked).toBe(true);
  await waitFor(() => {
    expect(answersIn(router)).toEqual({ duty: "drag" });
  });
  expect(router.state.location.pathname).toBe("/build/duty");
  await user.keyboard("{Enter}");
  await screen.findByRole("heading", { level: 1, name: "Casting" });
  expect(document.activeElement?.textContent).toBe("Casting");
  await user.click(await radio(/^Marl/));
  // Choices that have one option in the family are answered with it.
  await waitFor(() => {
    expect(answersIn(router)).toMatchObject({ duty: "drag", family: "marl", deckHeight: "d9025" });
  });
  expect(screen.getByText(/^Price \$2,940\.00; ships/)).toBeDefined();
});

it("leads back from a fresh sheet to the build in progress", async () => {
  const { router, user } = openBuild("/build/duty");
  await user.click(await radio(/^Marine/));
  await waitFor(() => {
    expect(window.sessionStorage.getItem("build-in-progress")).toMatch(/^\/build\/duty\?spec=/);
  });
  cleanup();
  const fresh = openBuild("/build");
  await fresh.user.click(await screen.findByText("Go on with it"));
  await waitFor(() => {
    expect(answersIn(fresh.router)).toEqual(answersIn(router));
  });
  expect((await radio(/^Marine/)).checked).toBe(true);
});

it("changes the family freely while nothing was chosen that the other lacks", async () => {
  const { router, user } = openBuild(`/build/casting?spec=${specOf({ duty: "drag" })}`);
  await user.click(await radio(/^Marl/));
  expect((await radio(/^9\.025/)).checked).toBe(true);
  expect((await radio(/^Gneiss/)).getAttribute("aria-disabled")).toBe("false");
  await user.click(await radio(/^Gneiss/));
  await waitFor(() => {
    expect(answersIn(router)).toEqual({ duty: "drag", family: "gneiss", mainSize: "m2750" });
  });
});

it("keeps the build over Back and Forward, and undoes options without moving", async () => {
  const { router, user } = openBuild("/build/duty");
  await user.click(await radio(/^Street/));
  await user.keyboard("{Enter}");
  await user.click(await radio(/^Basalt/));
  await router.navigate(-1);
  expect((await radio(/^Street/)).checked).toBe(true);
  await waitFor(() => {
    expect(answersIn(router)).toMatchObject({ duty: "street", family: "basalt" });
  });
  await user.click(await radio(/^Marine/));
  await user.keyboard("{Control>}z{/Control}");
  expect((await radio(/^Street/)).checked).toBe(true);
  expect(router.state.location.pathname).toBe("/build/duty");
  expect(screen.getByText(/^Undone\./)).toBeDefined();
  await user.click(screen.getByRole("button", { name: "Redo" }));
  expect((await radio(/^Marine/)).checked).toBe(true);
});

it("keeps a closed option in sight with its reason, and lets it in with its mend", async () => {
  const spec = specOf({ family: "marl", rotatingAssembly: "s3750r6000steel", strokeClearance: "asCast" });
  const { router, user } = openBuild(`/build/rotating-assembly?spec=${spec}`);
  const closed = await radio(/^3\.875 stroke, 6\.000 steel rods/);
  expect(closed.getAttribute("aria-disabled")).toBe("true");
  closed.focus();
  expect(document.activeElement).toBe(closed);
  const reasonId = closed.getAttribute("aria-describedby")?.split(" ")[0] ?? "";
  await waitFor(() => {
    expect(document.getElementById(reasonId)?.textContent).toMatch(
      /^Closed\. Steel rods need 0\.060 in to the case/,
    );
  });
  await user.click(closed);
  expect(closed.checked).toBe(false);
  const row = closed.closest("div");
  if (row === null) throw new Error("the radio stands in no row");
  await user.click(
    within(row).getByRole("button", { name: "Also change stroke clearance to relieved, +$145" }),
  );
  await waitFor(() => {
    expect(answersIn(router)).toMatchObject({
      rotatingAssembly: "s3875r6000steel",
      strokeClearance: "relieved",
    });
  });
  expect(document.activeElement).toBe(await radio(/^Relieved/));
  expect(screen.getByText(/^Stroke clearance changed to Relieved\. Price .*, up \$145\.00/)).toBeDefined();
  expect(screen.getByRole("group", { name: "What changed with it" })).toBeDefined();
});

it("takes a bore that is typed, and says why another is closed", async () => {
  const spec = specOf({ family: "marl", induction: "boosted" });
  const { router, user } = openBuild(`/build/bore-and-deck?spec=${spec}`);
  const box = await screen.findByRole<HTMLInputElement>("textbox", { name: "Type a bore" });
  await user.type(box, "4.030{Enter}");
  expect((await radio(/^4\.030/)).checked).toBe(true);
  await user.type(box, "4.125{Enter}");
  expect((await radio(/^4\.030/)).checked).toBe(true);
  expect(document.activeElement).toBe(await radio(/^4\.125/));
  expect(
    screen.getByText(/^4\.125 in is closed\. Boost or nitrous needs a cylinder wall of 0\.250 in/),
  ).toBeDefined();
  await user.type(box, "3.9{Enter}");
  expect(screen.getByText(/^There is no 3\.9 here\. Sizes run from 4\.000 in to 4\.155 in\./)).toBeDefined();
  expect(router.state.location.pathname).toBe("/build/bore-and-deck");
});

it("refuses a number that would leave nothing open, keeps what was typed, and offers the mend", async () => {
  const answers = completed({
    family: "marl",
    duty: "drag",
    induction: "naturallyAspirated",
    capStyle: "twoBolt",
  });
  const { router, user } = openBuild(`/build/duty?spec=${specOf(answers)}`);
  const power = await screen.findByRole<HTMLInputElement>("textbox", { name: /^Power aimed at/ });
  await user.type(power, "500{Enter}");
  expect(power.value).toBe("500");
  expect(power.getAttribute("aria-invalid")).toBe("true");
  expect(router.state.location.pathname).toBe("/build/duty");
  expect(router.state.location.search).not.toContain("powerAim");
  const offers = screen.getAllByRole("button", { name: /^Also change main caps to four-bolt straight/ });
  const offer = offers.find(
    (button) => (power.compareDocumentPosition(button) & Node.DOCUMENT_POSITION_FOLLOWING) !== 0,
  );
  if (offer === undefined) throw new Error("no mend stands under the number");
  await user.click(offer);
  await waitFor(() => {
    expect(new URLSearchParams(router.state.location.search).get("n.powerAim")).toBe("500");
  });
  expect(answersIn(router)).toMatchObject({ capStyle: "fourBoltStraight" });
});

it("says what is wrong with a spec code in the address and offers the ways on", async () => {
  const spec = specOf({ family: "marl" });
  const slipped = `${spec.slice(0, -1)}${spec.endsWith("0") ? "1" : "0"}`;
  openBuild(`/build/duty?spec=${slipped}`);
  const groups = spec.split("-").length;
  expect(await screen.findByText(new RegExp(`^Group ${groups} of the spec code has a slip`))).toBeDefined();
  expect(screen.getByRole("link", { name: "Start a new build" })).toBeDefined();
});

it("says what breaks a build that came by a link, and makes it whole", async () => {
  const answers = {
    ...completed({ family: "marl", bore: "b4000", capStyle: "twoBolt" }),
    induction: "boosted",
  };
  const { router, user } = openBuild(`/build/bottom-end?spec=${specOf(answers)}`);
  expect(await screen.findByText("The build cannot be made as it stands")).toBeDefined();
  await user.click(await screen.findByRole("button", { name: /^Change induction to naturally aspirated/ }));
  await waitFor(() => {
    expect(screen.queryByText("The build cannot be made as it stands")).toBeNull();
  });
  expect(answersIn(router)).toMatchObject({ capStyle: "twoBolt", induction: "naturallyAspirated" });
});
