import { screen, waitFor } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, beforeEach, expect, it } from "vitest";
import { sessionView } from "#tests/support/client-records.ts";
import { openShop, refuse, renderPage, type Shop } from "#tests/support/client.tsx";
import { ownPath } from "#web/features/account/own-path.ts";
import { SignInForm } from "#web/features/account/sign-in-form.tsx";
import type { DemoView } from "#shared/contracts/session.ts";
import { Component as Verify } from "#web/routes/account/verify.tsx";

let shop: Shop;

beforeEach(async () => {
  shop = await openShop();
  shop.answers["GET /api/session"] = sessionView();
});

afterEach(() => shop.close());

it("shows the refusal on the form, keeps the e-mail, and signs in at the next try", async () => {
  const user = userEvent.setup({ delay: null });
  let signedIn = 0;
  renderPage(
    <SignInForm
      demo={null}
      onSignedIn={() => {
        signedIn += 1;
      }}
    />,
  );
  const message = "Address and password do not fit together.";
  shop.answers["POST /api/account/sign-in"] = refuse(422, "validation", message, {
    errors: [{ path: "password", message }],
  });
  await user.type(screen.getByLabelText("E-mail"), "dana@example.com");
  await user.type(screen.getByLabelText("Password"), "not the one{Enter}");
  const summary = await screen.findByRole("group", { name: "Not signed in" });
  await waitFor(() => {
    expect(document.activeElement).toBe(summary);
  });
  expect(screen.getByLabelText<HTMLInputElement>("E-mail").value).toBe("dana@example.com");
  shop.answers["POST /api/account/sign-in"] = sessionView();
  await user.click(screen.getByRole("button", { name: "Sign in" }));
  await waitFor(() => {
    expect(signedIn).toBe(1);
  });
});

const demo: DemoView = {
  password: "a demo password",
  accounts: [{ role: "planner", email: "planner@shop.example" }],
};

it("names accounts of the demonstration only where it is one", async () => {
  renderPage(<SignInForm demo={null} onSignedIn={() => undefined} />);
  expect(screen.queryByText(/demonstration/)).toBeNull();
  renderPage(<SignInForm demo={demo} onSignedIn={() => undefined} />);
  expect(await screen.findByRole("heading", { name: "Accounts of the demonstration" })).toBeDefined();
});

it.each([
  ["/checkout", "/checkout"],
  ["/orders/K7Q4-M2XD?from=mail#top", "/orders/K7Q4-M2XD?from=mail#top"],
  [null, null],
  ["", null],
  ["checkout", null],
  ["https://elsewhere.example/", null],
  ["//elsewhere.example/", null],
  ["/\\elsewhere.example/", null],
  ["/\t/elsewhere.example/", null],
  ["javascript:alert(1)", null],
  ["/account/sign-in?next=/account/sign-in", null],
])("leads on to %s only within the program", (next, expected) => {
  expect(ownPath(next)).toBe(expected);
});

it("confirms an address only at the press, and takes the token out of the address bar", async () => {
  const token = "a-token-of-more-than-twenty-characters";
  shop.answers["POST /api/account/verify"] = { message: "Confirmed." };
  const { router } = renderPage(<Verify />, {
    at: `/account/verify?token=${token}`,
    pattern: "/account/verify",
  });
  const button = await screen.findByRole("button", { name: "Confirm the address" });
  await waitFor(() => {
    expect(router.state.location.search).toBe("");
  });
  expect(shop.bodies("POST /api/account/verify")).toEqual([]);
  await userEvent.click(button);
  expect(await screen.findByRole("heading", { name: "Your e-mail address is confirmed" })).toBeDefined();
  expect(shop.bodies("POST /api/account/verify")).toEqual([{ token }]);
});
