import type { Address } from "#shared/contracts/address.ts";

const address: Address = {
  line1: "14 Foundry Row",
  line2: "",
  city: "Osier Creek",
  state: "TN",
  postalCode: "37099",
  country: "US",
};

/** The invented shop of the demo; the telephone number is of the range kept for fiction. */
export const demoShop = {
  name: "Osier Creek Iron",
  email: "orders@osiercreek.example",
  phone: "+16155550110",
  address,
  timeZone: "America/Chicago",
};
