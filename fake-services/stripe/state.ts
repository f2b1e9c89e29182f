import { existsSync, readFileSync, renameSync, writeFileSync } from "node:fs";
import { type State, stateSchema } from "./records.ts";

export interface Store {
  readonly state: State;
  /** Writes everything down, if there is a file; what is answered after this survives a kill. */
  save(): void;
}

/** Opens the records, from the file where there is one. */
export function openStore(file: string | undefined): Store {
  const state = file !== undefined && existsSync(file) ? read(file) : emptyState();
  return {
    state,
    save() {
      if (file === undefined) return;
      const beside = `${file}.${process.pid}.new`;
      writeFileSync(beside, JSON.stringify(state), { mode: 0o600 });
      renameSync(beside, file);
    },
  };
}

function read(file: string): State {
  return stateSchema.parse(JSON.parse(readFileSync(file, "utf8")));
}

function emptyState(): State {
  return {
    sessions: {},
    sessionLines: {},
    intentData: {},
    intents: {},
    waitingCards: {},
    charges: {},
    refunds: {},
    calculations: {},
    calculationLines: {},
    events: {},
    deliveries: [],
    idempotentResults: {},
  };
}
