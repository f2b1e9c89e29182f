import { QueryClient } from "@tanstack/react-query";
import { ApiProblem } from "./problems.ts";

/** One client for the whole program. A refusal is final; a fault or a lost connection is tried twice more. */
export const queryClient = new QueryClient({
  defaultOptions: {
    queries: {
      staleTime: 30_000,
      retry: (failures, error) => failures < 2 && !(error instanceof ApiProblem && error.status < 500),
    },
  },
});
