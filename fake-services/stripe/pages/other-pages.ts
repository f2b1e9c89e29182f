import { successUrlOf } from "../payments.ts";
import type { Session } from "../records.ts";
import { html } from "./html.ts";
import { money, page } from "./layout.ts";

/** Where the buyer's bank asks whether it is really the buyer. */
export function confirmPage(merchant: string, session: Session): string {
  const content = html`
    <h1>Your bank asks you to confirm</h1>
    <p>
      ${money(session.amount_total, session.currency)} to ${merchant}. In this test you choose what happens.
    </p>
    <form method="post" action="/pay/${session.id}/confirm">
      <button type="submit" name="decision" value="complete">Complete</button>
      <button type="submit" name="decision" value="fail" class="second">Fail</button>
    </form>
  `;
  return page("Confirm with your bank", merchant, content);
}

/** A session that can no longer be paid. */
export function closedPage(merchant: string, session: Session): string {
  const content =
    session.status === "complete"
      ? html`
          <h1>This order is already paid</h1>
          <p>${money(session.amount_total, session.currency)} was paid. Nothing more is charged.</p>
          <p class="back"><a href="${successUrlOf(session)}">Back to ${merchant}</a></p>
        `
      : html`
          <h1>This payment page has expired</h1>
          <p>Nothing was charged. Start the payment again from your cart.</p>
          ${
            session.cancel_url === null
              ? undefined
              : html`<p class="back"><a href="${session.cancel_url}">Back to ${merchant}</a></p>`
          }
        `;
  return page(session.status === "complete" ? "Already paid" : "Expired", merchant, content);
}

/** An address that belongs to no session. */
export function unknownPage(merchant: string): string {
  const content = html`
    <h1>There is no such payment page</h1>
    <p>Check the address, or start the payment again from your cart.</p>
  `;
  return page("Not found", merchant, content);
}
