import { accountRoutes } from "./account.ts";
import { buildRoutes } from "./builds.ts";
import { cartRoutes } from "./cart.ts";
import { catalogueRoutes } from "./catalogue.ts";
import { checkoutRoutes } from "./checkout.ts";
import type { Route } from "./define-route.ts";
import { messageRoutes } from "./messages.ts";
import { orderLinkRoutes } from "./order-link.ts";
import { orderRoutes } from "./orders.ts";
import { sessionRoutes } from "./session.ts";
import { targetRoutes } from "./targets.ts";

/** Every route that asks a policy. What is not in this list is not served. */
export const routes: readonly Route[] = [
  ...sessionRoutes,
  ...accountRoutes,
  ...catalogueRoutes,
  ...buildRoutes,
  ...targetRoutes,
  ...cartRoutes,
  ...checkoutRoutes,
  ...orderRoutes,
  ...orderLinkRoutes,
  ...messageRoutes,
];
