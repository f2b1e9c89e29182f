import { brandOf } from "./cards.ts";
import { passesLuhn } from "./luhn.ts";
import type { CardDetails } from "./records.ts";

/** What the buyer typed. */
export interface CardEntry {
  number: string;
  /** Month and year: "12 / 34", "12/34", "1234", "12/2034". */
  expiry: string;
  cvc: string;
  name: string;
}

export interface CardProblem {
  code: string;
  message: string;
}

export type CardProblems = Partial<Record<keyof CardEntry, CardProblem>>;

export interface CheckedCard {
  number: string;
  name: string;
  details: CardDetails;
}

/** Checks what can be known without asking the bank. `now` in Unix seconds. */
export function checkCard(entry: CardEntry, now: number): CheckedCard | { problems: CardProblems } {
  const number = entry.number.replace(/[\s-]/g, "");
  const brand = brandOf(number);
  const expiry = readExpiry(entry.expiry);
  const name = entry.name.trim();
  const problems: CardProblems = {
    ...problemOf("number", numberProblem(number)),
    ...problemOf("expiry", expiry === undefined ? unreadableExpiry : expiryProblem(expiry, now)),
    ...problemOf("cvc", cvcProblem(entry.cvc.trim(), brand)),
    ...problemOf(
      "name",
      name === "" ? { code: "incomplete_name", message: "Enter the name on the card." } : undefined,
    ),
  };
  if (expiry === undefined || Object.keys(problems).length > 0) return { problems };
  return {
    number,
    name,
    details: {
      brand,
      country: "US",
      exp_month: expiry.month,
      exp_year: expiry.year,
      funding: "credit",
      last4: number.slice(-4),
    },
  };
}

function problemOf(field: keyof CardEntry, problem: CardProblem | undefined): CardProblems {
  return problem === undefined ? {} : { [field]: problem };
}

function numberProblem(number: string): CardProblem | undefined {
  if (number === "") return { code: "incomplete_number", message: "Enter the card number." };
  if (!/^\d{12,19}$/.test(number)) {
    return { code: "invalid_number", message: "A card number has 12 to 19 digits." };
  }
  if (!passesLuhn(number)) {
    return { code: "incorrect_number", message: "This card number is not right. Check its digits." };
  }
  return undefined;
}

const unreadableExpiry: CardProblem = {
  code: "invalid_expiry_month",
  message: "Enter the expiry as month and year, such as 12 / 34.",
};

function readExpiry(text: string): { month: number; year: number } | undefined {
  const match =
    /^\s*(0?[1-9]|1[0-2])\s*\/\s*(\d{2}|\d{4})\s*$/.exec(text) ?? /^(0[1-9]|1[0-2])(\d{2})$/.exec(text);
  if (match === null) return undefined;
  const year = Number(match[2]);
  return { month: Number(match[1]), year: year < 100 ? 2000 + year : year };
}

function expiryProblem(expiry: { month: number; year: number }, now: number): CardProblem | undefined {
  const today = new Date(now * 1000);
  const months = (expiry.year - today.getUTCFullYear()) * 12 + expiry.month - 1 - today.getUTCMonth();
  if (months < 0) return { code: "invalid_expiry_year", message: "This expiry is in the past." };
  if (months > 50 * 12) return { code: "invalid_expiry_year", message: "This expiry is too far ahead." };
  return undefined;
}

function cvcProblem(cvc: string, brand: string): CardProblem | undefined {
  const digits = brand === "amex" ? 4 : 3;
  if (cvc.length === digits && /^\d+$/.test(cvc)) return undefined;
  return { code: "invalid_cvc", message: `The CVC of this card has ${digits} digits.` };
}
