import { useQueryClient } from "@tanstack/react-query";
import { useEffect } from "react";
import { ApiProblem, ConnectionProblem } from "#web/lib/problems.ts";
import { closeOrder, openOrder, orderReviewQuery } from "./queries.ts";

const everyMinute = 60_000;

/**
 * Tells the others, once a minute, that this reader has the order open, and that it was put down on leaving.
 * What comes back shows who else has it and today's estimate.
 */
export function useHoldOpen(number: string, active: boolean): void {
  const client = useQueryClient();
  useEffect(() => {
    if (!active) return;
    let left = false;
    const say = async () => {
      try {
        const review = await openOrder(number);
        if (!left) client.setQueryData(orderReviewQuery(number).queryKey, review);
      } catch (error) {
        // A lost connection or an ended session shows at the page's own requests; the mark simply runs out.
        if (!(error instanceof ConnectionProblem || error instanceof ApiProblem)) throw error;
      }
    };
    void say();
    const timer = setInterval(() => void say(), everyMinute);
    return () => {
      left = true;
      clearInterval(timer);
      void closeOrder(number).catch((error: unknown) => {
        if (!(error instanceof ConnectionProblem || error instanceof ApiProblem)) throw error;
      });
    };
  }, [client, number, active]);
}
