import { readVisit, writeVisit } from "./visit-store.ts";

const key = (specCode: string) => `special-request ${specCode}`;

/** What was typed as a special request for this spec and not sent yet. */
export function specialRequestDraft(specCode: string): string {
  return readVisit(key(specCode)) ?? "";
}

export function keepSpecialRequest(specCode: string, text: string): void {
  writeVisit(key(specCode), text === "" ? null : text);
}
