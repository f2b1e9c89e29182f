import type { ReactElement } from "react";
import { createBrowserRouter, Outlet, redirect, ScrollRestoration, type RouteObject } from "react-router-dom";
import { Skeleton } from "#web/components/skeleton.tsx";
import { AccountLayout } from "./layouts/account-layout.tsx";
import { CounterLayout } from "./layouts/counter-layout.tsx";
import { FloorLayout } from "./layouts/floor-layout.tsx";
import { OfficeLayout } from "./layouts/office-layout.tsx";
import { ApiProblem } from "./lib/problems.ts";
import { queryClient } from "./lib/query-client.ts";
import { mayEnter, sessionQuery, type Place } from "./lib/session.ts";
import { NotFound } from "./routes/not-found.tsx";
import { PlaceError, RouteError } from "./routes/route-error.tsx";

/*
 * The table of addresses. One lazy file an address:
 *   { path: "/families", lazy: () => import("./routes/counter/families.tsx") }
 * The file exports `Component` and, where the fetch can start before the page is drawn, `loader`.
 */

const counterPages: RouteObject[] = [
  { path: "/", lazy: () => import("./routes/counter/home.tsx") },
  { path: "/families", lazy: () => import("./routes/counter/families.tsx") },
  { path: "/families/:family", lazy: () => import("./routes/counter/family.tsx") },
  {
    path: "/build",
    lazy: () => import("./routes/counter/build.tsx"),
    children: [
      { index: true, lazy: () => import("./routes/counter/build-start.tsx") },
      { path: "review", lazy: () => import("./routes/counter/review.tsx") },
      { path: ":step", lazy: () => import("./routes/counter/build-step.tsx") },
    ],
  },
  { path: "/cart", lazy: () => import("./routes/counter/cart.tsx") },
  { path: "/checkout", lazy: () => import("./routes/counter/checkout.tsx") },
  { path: "/checkout/return", lazy: () => import("./routes/counter/checkout-return.tsx") },
  { path: "/orders/link-ended", lazy: () => import("./routes/counter/order-link-ended.tsx") },
  { path: "/orders/:number", lazy: () => import("./routes/counter/order.tsx") },
];

/** Signing in and its kin: open to anyone. */
const signInPages: RouteObject[] = [
  { path: "/account/sign-in", lazy: () => import("./routes/account/sign-in.tsx") },
  { path: "/account/register", lazy: () => import("./routes/account/register.tsx") },
  { path: "/account/verify", lazy: () => import("./routes/account/verify.tsx") },
  { path: "/account/forgot", lazy: () => import("./routes/account/forgot.tsx") },
  { path: "/account/reset", lazy: () => import("./routes/account/reset.tsx") },
];

/** What is one's own: only signed in. */
const ownPages: RouteObject[] = [
  { path: "/account", lazy: () => import("./routes/account/account.tsx") },
  { path: "/account/orders", lazy: () => import("./routes/account/orders.tsx") },
];

const floorPages: RouteObject[] = [
  { path: "/floor", lazy: () => import("./routes/floor/orders.tsx") },
  { path: "/floor/orders/:number", lazy: () => import("./routes/floor/order.tsx") },
];

const officePages: RouteObject[] = [
  { path: "/office", lazy: () => import("./routes/office/office.tsx") },
  { path: "/office/messages", lazy: () => import("./routes/office/messages.tsx") },
  { path: "/office/messages/:id", lazy: () => import("./routes/office/message.tsx") },
];

const whoMayEnter: Record<Place, string> = {
  floor: "The Floor is for the shop's own people",
  office: "The Office is for the shop's managers",
};

/**
 * Sends strangers to sign in and back, and tells others that the door is closed to them.
 * The server guards every record by itself; this spares a walk to an empty page.
 */
function guard(place: Place | null) {
  return async ({ request }: { request: Request }) => {
    const { person } = await queryClient.ensureQueryData(sessionQuery);
    if (person === null) {
      const { pathname, search } = new URL(request.url);
      return redirect(`/account/sign-in?next=${encodeURIComponent(pathname + search)}`);
    }
    if (place !== null && !mayEnter(place, person.role)) {
      throw new ApiProblem({
        type: "/problems/not-allowed",
        title: whoMayEnter[place],
        detail: `You are signed in as ${person.name}, who may not enter it. Ask the office, or sign in as somebody else.`,
        status: 403,
      });
    }
    return null;
  };
}

interface Frame {
  Component: () => ReactElement;
  loader?: ReturnType<typeof guard>;
}

/** Pages within a frame that stays while one of them loads or fails. */
function within(frame: Frame, pages: RouteObject[]): RouteObject {
  return {
    ...frame,
    ErrorBoundary: PlaceError,
    children: [{ ErrorBoundary: RouteError, HydrateFallback: Skeleton, children: pages }],
  };
}

function Root() {
  return (
    <>
      <Outlet />
      <ScrollRestoration />
    </>
  );
}

/** While it is asked whether the reader may enter: plain paper. */
function Entering() {
  return (
    <div className="mx-auto max-w-page px-4 py-24 sm:px-6">
      <Skeleton lines={8} />
    </div>
  );
}

export const router = createBrowserRouter([
  {
    Component: Root,
    HydrateFallback: Entering,
    children: [
      within({ Component: CounterLayout }, [...counterPages, { path: "*", Component: NotFound }]),
      within({ Component: AccountLayout }, [...signInPages, { loader: guard(null), children: ownPages }]),
      within({ Component: FloorLayout, loader: guard("floor") }, floorPages),
      within({ Component: OfficeLayout, loader: guard("office") }, officePages),
    ],
  },
]);
