import type { Page } from "playwright-core";
import { demoCatalogue } from "#server/demo/catalogue/catalogue.ts";
import type { Build } from "#shared/catalogue/build.ts";
import { buildToSearch } from "#shared/catalogue/build-address.ts";
import { messageListSchema } from "#shared/contracts/messages.ts";
import { marl400 } from "../shared/demo/context.ts";
import type { TestShop } from "../support/test-server.ts";
import { fillCart, signedIn, Visitor } from "../support/visitor.ts";
import { expiredPayment, paidOrder } from "./shop-state.ts";

/** Who looks at a page. */
type Reader = "visitor" | "cart" | "buyer" | "late" | "customer" | "dealer" | "planner" | "floor" | "office";

/** What is known once the shop has been prepared. */
export interface PreparedShop {
  readers: Record<Reader, Visitor>;
  orderNumber: string;
  paidSession: string;
  expiredSession: string;
  messageId: string;
}

export interface ShopPage {
  name: string;
  reader: Reader;
  path: string | ((prepared: PreparedShop) => string);
  /** The page's first heading once it is all there; text that comes last where the heading comes early. */
  shows: string | RegExp;
  /** What is done there before it is looked at. */
  then?: (page: Page) => Promise<void>;
}

const queryOf = (build: Build): string => new URLSearchParams(buildToSearch(demoCatalogue, build)).toString();
const whole = queryOf(marl400);
const broken = queryOf({
  ...marl400,
  answers: { ...marl400.answers, rotatingAssembly: "s3875r6000steel" },
});

/** Boost closes the larger bores. */
const boosted = queryOf({ ...marl400, answers: { family: "marl", duty: "street", induction: "boosted" } });

const press = (name: RegExp, shows: RegExp) => async (page: Page) => {
  await page.getByRole("main").getByRole("button", { name }).first().click();
  await page.getByText(shows).first().waitFor();
};

const counter: ShopPage[] = [
  { name: "the front door", reader: "visitor", path: "/", shows: /./ },
  { name: "the families", reader: "visitor", path: "/families", shows: /./ },
  { name: "a family", reader: "visitor", path: "/families/marl", shows: /Marl/ },
  { name: "a build's first step", reader: "visitor", path: "/build/duty", shows: /Duty/ },
  ...demoCatalogue.steps.map(({ id, name }): ShopPage => ({
    name: `the step ${name} of a whole build`,
    reader: "visitor",
    path: `/build/${id}?${whole}`,
    shows: name,
  })),
  {
    name: "a size chart with the reason of a closed size",
    reader: "visitor",
    path: `/build/bore-and-deck?${boosted}`,
    shows: /Bore/,
    then: async (page) => {
      await page.locator('input[type="radio"][aria-disabled="true"]').first().focus();
      await page.getByText("Closed.").first().waitFor();
    },
  },
  {
    name: "a step of a build that breaks a rule",
    reader: "visitor",
    path: `/build/rotating-assembly?${broken}`,
    shows: "Rotating assembly",
  },
  { name: "the review", reader: "visitor", path: `/build/review?${whole}`, shows: "Review" },
  {
    name: "the review of a broken build",
    reader: "visitor",
    path: `/build/review?${broken}`,
    shows: "Review",
  },
  {
    name: "a spec code that cannot be opened",
    reader: "visitor",
    path: "/build/duty?spec=0104-XXXX-XXXX",
    shows: "This spec code cannot be opened",
  },
  { name: "the empty cart", reader: "visitor", path: "/cart", shows: "Cart" },
  { name: "the cart", reader: "cart", path: "/cart", shows: "Cart" },
  { name: "the checkout of an empty cart", reader: "visitor", path: "/checkout", shows: "Check out" },
  { name: "the checkout", reader: "cart", path: "/checkout", shows: "Check out" },
  {
    name: "the checkout with errors",
    reader: "cart",
    path: "/checkout",
    shows: "Check out",
    then: press(/^Pay/, /things to mend/),
  },
  {
    name: "the return page, paid",
    reader: "buyer",
    path: ({ paidSession }) => `/checkout/return?session=${paidSession}`,
    shows: /paid/i,
  },
  {
    name: "the return page, run out",
    reader: "late",
    path: ({ expiredSession }) => `/checkout/return?session=${expiredSession}`,
    shows: /./,
  },
  {
    name: "the order of a guest",
    reader: "buyer",
    path: ({ orderNumber }) => `/orders/${orderNumber}`,
    shows: /^Order/,
  },
  {
    name: "an order of somebody else",
    reader: "visitor",
    path: ({ orderNumber }) => `/orders/${orderNumber}`,
    shows: "This order cannot be shown here",
  },
  {
    name: "an order link that ended",
    reader: "visitor",
    path: "/orders/link-ended",
    shows: "This link no longer opens an order",
  },
  { name: "an address that is not there", reader: "visitor", path: "/no-such-page", shows: /./ },
];

const account: ShopPage[] = [
  { name: "registering", reader: "visitor", path: "/account/register", shows: "Make an account" },
  {
    name: "registering with errors",
    reader: "visitor",
    path: "/account/register",
    shows: "Make an account",
    then: press(/^Make/, /things to mend/),
  },
  {
    name: "confirming an address",
    reader: "visitor",
    path: "/account/verify?token=none",
    shows: "Confirm your e-mail address",
  },
  {
    name: "a link that confirms nothing",
    reader: "visitor",
    path: "/account/verify",
    shows: "This link cannot confirm an address",
  },
  {
    name: "signing in with a wrong password",
    reader: "visitor",
    path: "/account/sign-in",
    shows: "Sign in",
    then: async (page) => {
      await page.getByLabel("E-mail").fill("nobody@example.com");
      await page.getByLabel("Password").fill("not-the-password");
      await press(/^Sign in/, /Not signed in/)(page);
    },
  },
  {
    name: "the forgotten password",
    reader: "visitor",
    path: "/account/forgot",
    shows: "Forgot the password",
  },
  {
    name: "setting a new password",
    reader: "visitor",
    path: "/account/reset?token=none",
    shows: "Set a new password",
  },
  { name: "the account", reader: "customer", path: "/account", shows: "My account" },
  { name: "my orders", reader: "customer", path: "/account/orders", shows: "My orders" },
  { name: "my orders without any", reader: "dealer", path: "/account/orders", shows: "My orders" },
];

const shopFloor: ShopPage[] = [
  { name: "the floor's queue", reader: "planner", path: "/floor", shows: /Orders/ },
  {
    name: "the floor's queue without a match",
    reader: "floor",
    path: "/floor?search=nobody",
    shows: /Orders/,
  },
  {
    name: "an order on the floor",
    reader: "floor",
    path: ({ orderNumber }) => `/floor/orders/${orderNumber}`,
    shows: /^Order/,
  },
  {
    name: "an order before the planner",
    reader: "planner",
    path: ({ orderNumber }) => `/floor/orders/${orderNumber}`,
    shows: /^Order/,
  },
  {
    name: "declining an order",
    reader: "planner",
    path: ({ orderNumber }) => `/floor/orders/${orderNumber}`,
    shows: /^Order/,
    then: async (page) => {
      await page.getByRole("main").getByRole("button", { name: "Decline" }).click();
      await page.getByRole("dialog").getByLabel("Reason").waitFor();
    },
  },
  { name: "a place that is closed", reader: "customer", path: "/floor", shows: "This page cannot be shown" },
];

const office: ShopPage[] = [
  { name: "the office", reader: "office", path: "/office", shows: /./ },
  { name: "the messages", reader: "office", path: "/office/messages", shows: "Messages" },
  {
    name: "a message",
    reader: "office",
    path: ({ messageId }) => `/office/messages/${messageId}`,
    shows: /./,
  },
];

/** Every page of the product, in the states that people meet. */
export const shopPages: ShopPage[] = [...counter, ...account, ...shopFloor, ...office];

/** Makes over HTTP what the pages show. */
export async function prepareShop(shop: TestShop): Promise<PreparedShop> {
  const [customer, dealer, planner, floor, officePerson] = await Promise.all([
    signedIn(shop.origin, "customer"),
    signedIn(shop.origin, "dealer"),
    signedIn(shop.origin, "planner"),
    signedIn(shop.origin, "floor"),
    signedIn(shop.origin, "office"),
  ]);
  const cart = new Visitor(shop.origin);
  await fillCart(cart);
  await paidOrder(shop, { buyer: customer });
  const paid = await paidOrder(shop, { specialRequest: "Please call before pouring." });
  const expired = await expiredPayment(shop);
  const { messages } = messageListSchema.parse((await officePerson.get("/api/messages")).body);
  return {
    readers: {
      visitor: new Visitor(shop.origin),
      cart,
      buyer: paid.buyer,
      late: expired.guest,
      customer,
      dealer,
      planner,
      floor,
      office: officePerson,
    },
    orderNumber: paid.number,
    paidSession: paid.session,
    expiredSession: expired.session,
    messageId: messages[0]?.id ?? "",
  };
}
