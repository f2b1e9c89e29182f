import { MutationCache, QueryCache, QueryClient } from "@tanstack/react-query";
import { ApiProblem } from "./problems.ts";
import { sessionQuery } from "./session.ts";

/** The session ended while a page was open: it is read anew, so that the way to sign in leads to the form. */
function noticeEndedSession(error: Error): void {
  if (error instanceof ApiProblem && error.status === 401)
    void queryClient.invalidateQueries({ queryKey: sessionQuery.queryKey });
}

/** One client for the whole program. A refusal is final; a fault or a lost connection is tried twice more. */
export const queryClient = new QueryClient({
  queryCache: new QueryCache({ onError: noticeEndedSession }),
  mutationCache: new MutationCache({ onError: noticeEndedSession }),
  defaultOptions: {
    queries: {
      staleTime: 30_000,
      retry: (failures, error) => failures < 2 && !(error instanceof ApiProblem && error.status < 500),
    },
  },
});
