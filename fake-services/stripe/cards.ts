import type { CardDetails } from "./records.ts";

/** How the bank answers. `blocked` never reaches the bank. */
export interface Refusal {
  code: string;
  declineCode: string;
}

interface CardBehaviour {
  asksToConfirm: boolean;
  refusal: Refusal | null;
}

function declined(declineCode: string): CardBehaviour {
  return { asksToConfirm: false, refusal: { code: "card_declined", declineCode } };
}

const succeeds: CardBehaviour = { asksToConfirm: false, refusal: null };
const asksToConfirm: CardBehaviour = { asksToConfirm: true, refusal: null };

/** Published test numbers (references.md, 8.4) and what each does. */
const behaviours: Record<string, CardBehaviour> = {
  "4242424242424242": succeeds,
  "5555555555554444": succeeds,
  "378282246310005": succeeds,
  "6011111111111117": succeeds,
  "4000000000000002": declined("generic_decline"),
  "4000000000009995": declined("insufficient_funds"),
  "4000000000009987": declined("lost_card"),
  "4000000000009979": declined("stolen_card"),
  "4000000000006975": declined("card_velocity_exceeded"),
  "4000000000000069": {
    asksToConfirm: false,
    refusal: { code: "expired_card", declineCode: "expired_card" },
  },
  "4000000000000127": {
    asksToConfirm: false,
    refusal: { code: "incorrect_cvc", declineCode: "incorrect_cvc" },
  },
  // Fails its CVC check when one is given, and the payment page always asks for one.
  "4000000000000101": {
    asksToConfirm: false,
    refusal: { code: "incorrect_cvc", declineCode: "incorrect_cvc" },
  },
  "4000000000000119": {
    asksToConfirm: false,
    refusal: { code: "processing_error", declineCode: "processing_error" },
  },
  // Can be kept for later, but the charge itself fails.
  "4000000000000341": declined("generic_decline"),
  "4100000000000019": declined("fraudulent"),
  "4000002760003184": asksToConfirm,
  "4000002500003155": asksToConfirm,
  "4000000000003220": asksToConfirm,
  "4000008260003178": {
    asksToConfirm: true,
    refusal: { code: "card_declined", declineCode: "insufficient_funds" },
  },
};

/** What a card does; a sound number that is no published test number is refused, as in test mode. */
export function behaviourOf(number: string): CardBehaviour {
  return behaviours[number] ?? declined("test_mode_live_card");
}

export function brandOf(number: string): CardDetails["brand"] {
  if (/^4/.test(number)) return "visa";
  if (/^(5[1-5]|2[2-7])/.test(number)) return "mastercard";
  if (/^3[47]/.test(number)) return "amex";
  if (/^(6011|65)/.test(number)) return "discover";
  return "unknown";
}

const words: Record<string, string> = {
  generic_decline: "Your bank declined this card. Try another card.",
  insufficient_funds: "This card has too little money for the payment. Try another card.",
  lost_card: "Your bank declined this card. Try another card.",
  stolen_card: "Your bank declined this card. Try another card.",
  card_velocity_exceeded: "This card has been used too often for now. Try another card.",
  expired_card: "This card has expired. Try another card.",
  incorrect_cvc: "The CVC is not right for this card.",
  processing_error: "The card could not be processed. Try again in a moment.",
  fraudulent: "This card was declined. Try another card.",
  test_mode_live_card: "This page takes published test card numbers only.",
};

/** What the buyer is told. Lost, stolen and fraudulent are not named to whoever holds the card. */
export function refusalWords(refusal: Refusal): string {
  return words[refusal.declineCode] ?? "This card was declined. Try another card.";
}
