import { describe, expect, test } from "vitest";
import { demoCatalogue } from "#server/demo/catalogue/catalogue.ts";
import { emptyBuild } from "#shared/catalogue/build.ts";
import { buildToSearch, searchToBuild } from "#shared/catalogue/build-address.ts";
import { buildOf, marl400 } from "../demo/context.ts";

describe("the build in the address", () => {
  test("answers, numbers, mine and engraving come back", () => {
    const build = buildOf(marl400.answers, { powerAim: "500", rpmAim: "6200" }, ["family", "bore"]);
    const text = new URLSearchParams(buildToSearch(demoCatalogue, build, "OC 400")).toString();
    const read = searchToBuild(demoCatalogue, new URLSearchParams(`page=2&${text}`));
    expect(read).toEqual({ build, engraving: "OC 400", problems: [], spec: null });
  });

  test("an empty build needs no address", () => {
    expect(buildToSearch(demoCatalogue, emptyBuild)).toEqual([]);
    expect(searchToBuild(demoCatalogue, []).build).toEqual(emptyBuild);
  });

  test("what cannot be read is reported and the rest is kept", () => {
    const read = searchToBuild(demoCatalogue, [
      ["spec", "04U7"],
      ["n.powerAim", "many"],
      ["n.rpmAim", "6000"],
      ["n.colour", "4"],
      ["mine", "bore,shade"],
      ["engraving", "THIRTEEN SIGNS"],
    ]);
    expect(read.build).toEqual(buildOf({}, { rpmAim: "6000" }, ["bore"]));
    expect(read.spec).toMatchObject({ problem: "character" });
    expect(read.engraving).toBeNull();
    expect(read.problems.map(({ key }) => key)).toEqual([
      "spec",
      "n.powerAim",
      "n.colour",
      "mine",
      "engraving",
    ]);
  });

  test("the catalogue is found by the version in the code", () => {
    const pairs = buildToSearch(demoCatalogue, marl400);
    expect(searchToBuild((version) => (version === 1 ? demoCatalogue : undefined), pairs).build).toEqual(
      marl400,
    );
    expect(searchToBuild(() => undefined, pairs).spec).toMatchObject({ problem: "version", version: 1 });
  });
});
