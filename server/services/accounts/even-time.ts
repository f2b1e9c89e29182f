const LEAST_MILLISECONDS = 400;

/** Answers no sooner than a fixed time after the call, so that the time does not tell what was found. */
export async function inEvenTime<Result>(work: () => Promise<Result>): Promise<Result> {
  const [outcome] = await Promise.allSettled([
    work(),
    new Promise((resolve) => setTimeout(resolve, LEAST_MILLISECONDS)),
  ]);
  if (outcome.status === "rejected") throw outcome.reason;
  return outcome.value;
}
