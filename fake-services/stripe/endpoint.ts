import type { FormFields } from "./form-body.ts";
import type { Work } from "./work.ts";

/** One address of the API. `run` answers a record, or throws an ApiError. */
export interface Endpoint {
  method: "get" | "post";
  path: string;
  run(work: Work, call: { id: string; parameters: FormFields }): object;
}
