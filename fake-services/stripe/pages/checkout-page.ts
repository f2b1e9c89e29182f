import type { CardEntry, CardProblem, CardProblems } from "../card-entry.ts";
import type { Session, State } from "../records.ts";
import { html, type Html } from "./html.ts";
import { money, page } from "./layout.ts";

interface CheckoutPage {
  merchant: string;
  session: Session;
  lines: State["sessionLines"][string];
  /** What was typed before; number and CVC are asked again. */
  typed?: Pick<CardEntry, "expiry" | "name">;
  problems?: CardProblems;
  /** Why it was not paid. */
  refused?: string;
}

/** Where the buyer enters the card. */
export function checkoutPage(view: CheckoutPage): string {
  const { session, problems = {}, typed = { expiry: "", name: "" } } = view;
  const total = money(session.amount_total, session.currency);
  const content = html`
    <h1>Pay ${total}</h1>
    ${view.refused === undefined ? undefined : html`<p class="refused" role="alert">${view.refused}</p>`}
    ${orderTable(view, total)}
    ${session.customer_email === null ? undefined : html`<p>Receipt goes to ${session.customer_email}</p>`}
    <h2>Card</h2>
    <form method="post" action="/pay/${session.id}" novalidate>
      ${field({
        name: "number",
        label: "Card number",
        hint: "Published test numbers only",
        autocomplete: "cc-number",
        inputmode: "numeric",
        value: "",
        problem: problems.number,
      })}
      <div class="pair">
        <div>
          ${field({
            name: "expiry",
            label: "Expiry",
            hint: "Month / year",
            autocomplete: "cc-exp",
            inputmode: "numeric",
            value: typed.expiry,
            problem: problems.expiry,
          })}
        </div>
        <div>
          ${field({
            name: "cvc",
            label: "CVC",
            hint: "Printed on the card",
            autocomplete: "cc-csc",
            inputmode: "numeric",
            value: "",
            problem: problems.cvc,
          })}
        </div>
      </div>
      ${field({
        name: "name",
        label: "Name on card",
        autocomplete: "cc-name",
        inputmode: "text",
        value: typed.name,
        problem: problems.name,
      })}
      <button type="submit">Pay ${total}</button>
    </form>
    ${
      session.cancel_url === null
        ? undefined
        : html`<p class="back">
            <a href="${session.cancel_url}">Back to ${view.merchant} without paying</a>
          </p>`
    }
  `;
  return page(view.refused === undefined ? "Pay" : "Not paid", view.merchant, content);
}

function orderTable(view: CheckoutPage, total: string): Html {
  const rows = view.lines.map(
    ({ item, details }) => html`
      <tr>
        <th scope="row">
          ${item.description}${item.quantity > 1 ? ` x ${item.quantity}` : undefined}
          ${details === null ? undefined : html`<span class="details">${details}</span>`}
        </th>
        <td>${money(item.amount_total, item.currency)}</td>
      </tr>
    `,
  );
  return html`<table>
    <tbody>
      ${rows}
    </tbody>
    <tfoot>
      <tr>
        <th scope="row">Total</th>
        <td>${total}</td>
      </tr>
    </tfoot>
  </table>`;
}

function field(of: {
  name: string;
  label: string;
  hint?: string;
  autocomplete: string;
  inputmode: string;
  value: string;
  problem: CardProblem | undefined;
}): Html {
  const notes = [
    ...(of.hint === undefined ? [] : [`${of.name}-hint`]),
    ...(of.problem === undefined ? [] : [`${of.name}-problem`]),
  ].join(" ");
  return html`
    ${
      of.problem === undefined
        ? undefined
        : html`<p class="problem" id="${of.name}-problem">${of.problem.message}</p>`
    }
    <label for="${of.name}">${of.label}</label>
    ${of.hint === undefined ? undefined : html`<span class="hint" id="${of.name}-hint">${of.hint}</span>`}
    <input
      id="${of.name}"
      name="${of.name}"
      value="${of.value}"
      autocomplete="${of.autocomplete}"
      inputmode="${of.inputmode}"
      spellcheck="false"
      required
      ${notes === "" ? undefined : html`aria-describedby="${notes}"`}
      ${of.problem === undefined ? undefined : html`aria-invalid="true"`}
    />
  `;
}
