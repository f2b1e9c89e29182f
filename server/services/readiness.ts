import { isMigrated } from "#server/database/migrate.ts";
import { currentContext } from "#server/services/catalogue/current-context.ts";
import { shopSettings } from "#server/services/shop/shop-settings.ts";

export interface Readiness {
  ready: boolean;
  /** What is missing, in words; empty when ready. */
  missing: string[];
}

let migrated = false;

/** Whether this process can serve: the database is there and migrated, the shop and its catalogue are, jobs run. */
export async function readiness(workersRun: () => boolean): Promise<Readiness> {
  const missing: string[] = [];
  const check = async (what: string, works: () => Promise<unknown>): Promise<void> => {
    try {
      if ((await works()) === false) missing.push(what);
    } catch (error) {
      // The reason is for the log of whoever asks; the answer names only what is missing.
      missing.push(error instanceof Error ? what : String(error));
    }
  };
  await check("the database's newest shape", async () => (migrated ||= await isMigrated()));
  await check("the shop's settings", shopSettings);
  await check("a published catalogue with prices", currentContext);
  if (!workersRun()) missing.push("job workers");
  return { ready: missing.length === 0, missing };
}
