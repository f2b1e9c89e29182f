import { z } from "zod";
import { personNameSchema } from "./person.ts";

/** The 50 states and the District of Columbia (ISO 3166-2:US without territories). */
export const usStates = {
  AL: "Alabama",
  AK: "Alaska",
  AZ: "Arizona",
  AR: "Arkansas",
  CA: "California",
  CO: "Colorado",
  CT: "Connecticut",
  DE: "Delaware",
  DC: "District of Columbia",
  FL: "Florida",
  GA: "Georgia",
  HI: "Hawaii",
  ID: "Idaho",
  IL: "Illinois",
  IN: "Indiana",
  IA: "Iowa",
  KS: "Kansas",
  KY: "Kentucky",
  LA: "Louisiana",
  ME: "Maine",
  MD: "Maryland",
  MA: "Massachusetts",
  MI: "Michigan",
  MN: "Minnesota",
  MS: "Mississippi",
  MO: "Missouri",
  MT: "Montana",
  NE: "Nebraska",
  NV: "Nevada",
  NH: "New Hampshire",
  NJ: "New Jersey",
  NM: "New Mexico",
  NY: "New York",
  NC: "North Carolina",
  ND: "North Dakota",
  OH: "Ohio",
  OK: "Oklahoma",
  OR: "Oregon",
  PA: "Pennsylvania",
  RI: "Rhode Island",
  SC: "South Carolina",
  SD: "South Dakota",
  TN: "Tennessee",
  TX: "Texas",
  UT: "Utah",
  VT: "Vermont",
  VA: "Virginia",
  WA: "Washington",
  WV: "West Virginia",
  WI: "Wisconsin",
  WY: "Wyoming",
} as const;

export type UsState = keyof typeof usStates;
const stateCodes = Object.keys(usStates);
const isUsState = (code: string): code is UsState => stateCodes.includes(code);

const addressLine = (message: string) =>
  z
    .string()
    .trim()
    .min(1, message)
    .max(100, "Use at most 100 characters.")
    .regex(/^[^\p{Cc}]*$/u, "Use letters, digits and punctuation only.");

export const addressSchema = z.object({
  line1: addressLine("Write the street and number."),
  line2: z
    .string()
    .trim()
    .max(100, "Use at most 100 characters.")
    .regex(/^[^\p{Cc}]*$/u)
    .default(""),
  city: addressLine("Write the city."),
  state: z.string().refine(isUsState, "Choose a state."),
  postalCode: z
    .string()
    .trim()
    .regex(/^\d{5}(-\d{4})?$/, "Write a ZIP code of five digits, or ZIP+4."),
  country: z.literal("US").default("US"),
});
export type Address = z.infer<typeof addressSchema>;

/** A US telephone number, read leniently and kept in ITU E.164 form (+1 and ten digits). */
export const phoneSchema = z
  .string()
  .trim()
  .transform((text) => text.replace(/[\s().-]/g, "").replace(/^(?:\+?1)?(?=\d{10}$)/, "+1"))
  .pipe(
    z
      .string()
      .regex(/^\+1[2-9]\d{2}[2-9]\d{6}$/, "Write a US telephone number of ten digits with area code."),
  );

export const contactSchema = z.object({
  name: personNameSchema,
  email: z.string().trim().max(254).pipe(z.email("Write an e-mail address like name@example.com.")),
  phone: phoneSchema,
});

export const deliverySchema = z.discriminatedUnion("method", [
  z.object({ method: z.literal("pick-up") }),
  z.object({ method: z.literal("freight"), address: addressSchema }),
]);
export type Delivery = z.infer<typeof deliverySchema>;
