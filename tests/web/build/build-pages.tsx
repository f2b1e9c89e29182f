import { QueryClientProvider } from "@tanstack/react-query";
import { configure, render } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { createMemoryRouter, RouterProvider } from "react-router-dom";
import { demoCatalogue } from "#server/demo/catalogue/catalogue.ts";
import { demoPriceList } from "#server/demo/catalogue/price-list.ts";
import { encodeSpec } from "#shared/catalogue/spec-code.ts";
import type { CurrentCatalogue } from "#shared/contracts/catalogue.ts";
import { evaluate } from "#shared/rules/evaluate.ts";
import { Announcer } from "#web/components/announcer.tsx";
import { queryClient } from "#web/lib/query-client.ts";
import * as build from "#web/routes/counter/build.tsx";
import * as start from "#web/routes/counter/build-start.tsx";
import * as step from "#web/routes/counter/build-step.tsx";
import * as review from "#web/routes/counter/review.tsx";

// The whole form is drawn anew for every choice; on a busy machine that takes its time.
configure({ asyncUtilTimeout: 10_000 });

export const current: CurrentCatalogue = {
  catalogue: demoCatalogue,
  priceList: demoPriceList,
  load: { minutes: {} },
  today: "2026-12-01",
};

export function specOf(answers: Record<string, string>): string {
  return encodeSpec(demoCatalogue, answers);
}

/** The answers with every open choice answered by its first open option. */
export function completed(answers: Record<string, string>): Record<string, string> {
  const { choices, unanswered } = evaluate(current, { answers, numbers: {}, mine: [] });
  const [next] = unanswered;
  const option = choices.find(({ choice }) => choice === next)?.options.find(({ open }) => open)?.option;
  return next === undefined || option === undefined ? answers : completed({ ...answers, [next]: option });
}

/** The build's pages as the program has them, at an address. */
export function openBuild(address: string) {
  // jsdom lays nothing out.
  Element.prototype.scrollIntoView = () => undefined;
  queryClient.clear();
  const router = createMemoryRouter(
    [
      {
        path: "/build",
        ...build,
        HydrateFallback: () => null,
        children: [
          { index: true, ...start },
          { path: "review", ...review },
          { path: ":step", ...step },
        ],
      },
      { path: "*", element: <p>another page</p> },
    ],
    { initialEntries: [address] },
  );
  render(
    <QueryClientProvider client={queryClient}>
      <Announcer>
        <RouterProvider router={router} />
      </Announcer>
    </QueryClientProvider>,
  );
  return { router, user: userEvent.setup({ delay: null }) };
}
