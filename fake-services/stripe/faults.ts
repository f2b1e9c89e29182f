import { ApiError } from "./errors.ts";

export interface FaultPlan {
  /**
   * hang: no answer until the plan changes. 500, 429: refused before any work.
   * lose-answer: the work is done and kept, then the connection breaks.
   */
  mode: "none" | "hang" | "500" | "429" | "lose-answer";
  /** Beginnings of the addresses that are hit, such as /v1/refunds; none given means all. */
  paths: string[];
  /** How many requests are hit; null means all. */
  count: number | null;
}

/** Faults on demand. */
export class Faults {
  #plan: FaultPlan = { mode: "none", paths: [], count: null };
  readonly #hanging = new Set<() => void>();

  set(plan: FaultPlan): void {
    this.#plan = { ...plan };
    for (const letGo of this.#hanging) letGo();
    this.#hanging.clear();
  }

  /** How many requests hang at this moment. */
  get hanging(): number {
    return this.#hanging.size;
  }

  /**
   * Lets a request through, or not.
   * @returns whether the answer is to be lost after the work
   */
  async pass(path: string, gone: AbortSignal): Promise<{ loseAnswer: boolean }> {
    const mode = this.#take(path);
    switch (mode) {
      case "none":
        return { loseAnswer: false };
      case "lose-answer":
        return { loseAnswer: true };
      case "hang":
        await this.#hang(gone);
        return { loseAnswer: false };
      case "500":
        throw new ApiError({
          status: 500,
          type: "api_error",
          message: "A fault on demand",
          beforeWork: true,
        });
      case "429":
        throw new ApiError({
          status: 429,
          type: "invalid_request_error",
          code: "rate_limit",
          message: "Too many requests, on demand",
          beforeWork: true,
        });
    }
  }

  #take(path: string): FaultPlan["mode"] {
    const { mode, paths, count } = this.#plan;
    if (mode === "none" || count === 0) return "none";
    if (paths.length > 0 && !paths.some((start) => path.startsWith(start))) return "none";
    if (count !== null) this.#plan.count = count - 1;
    return mode;
  }

  #hang(gone: AbortSignal): Promise<void> {
    return new Promise((resolve) => {
      const letGo = (): void => {
        this.#hanging.delete(letGo);
        resolve();
      };
      this.#hanging.add(letGo);
      gone.addEventListener("abort", letGo, { once: true });
    });
  }
}
