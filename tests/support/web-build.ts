import { runNodeWell } from "./node-program.ts";

/** The browser tests open the built client: builds it when what it is made of changed. */
export default async function setup(): Promise<void> {
  await runNodeWell(["server/start/web-build.mjs"]);
}
