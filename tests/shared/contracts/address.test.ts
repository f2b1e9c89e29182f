import { describe, expect, it } from "vitest";
import { addressSchema, contactSchema, phoneSchema, usStates } from "#shared/contracts/address.ts";

describe("addresses", () => {
  it("know the 50 states and DC (ISO 3166-2:US without territories)", () => {
    expect(Object.keys(usStates)).toHaveLength(51);
  });

  it.each(["01001", "37203", "99501-1234"])("take the ZIP code %s, leading zeros kept", (postalCode) => {
    const address = { line1: "12 Mill Lane", city: "Ashford", state: "TN", postalCode };
    expect(addressSchema.parse(address)).toMatchObject({ postalCode, country: "US", line2: "" });
  });

  it.each(["1001", "3720a", "37203-12", ""])("refuse the ZIP code «%s» in words", (postalCode) => {
    const result = addressSchema.safeParse({
      line1: "12 Mill Lane",
      city: "Ashford",
      state: "TN",
      postalCode,
    });
    expect(result.error?.issues.map((issue) => issue.message)).toEqual([
      "Write a ZIP code of five digits, or ZIP+4.",
    ]);
  });

  it("refuse a state that is none, and control characters", () => {
    const wrong = addressSchema.safeParse({
      line1: "12 Mill\u0000Lane",
      city: "A",
      state: "XX",
      postalCode: "37203",
    });
    expect(wrong.error?.issues.map((issue) => issue.path.join("."))).toEqual(["line1", "state"]);
  });
});

describe("telephone numbers", () => {
  it.each(["(615) 555-0134", "615.555.0134", "+1 615 555 0134", "1-615-555-0134", "6155550134"])(
    "read %s as E.164",
    (text) => {
      expect(phoneSchema.parse(text)).toBe("+16155550134");
    },
  );

  it.each(["555-0134", "115 555 0134", "+44 20 7946 0958", "phone"])("refuse %s", (text) => {
    expect(phoneSchema.safeParse(text).success).toBe(false);
  });

  it("stay the same when read twice", () => {
    const contact = { name: "Ada", email: "ada@example.com", phone: "615 555 0134" };
    expect(contactSchema.parse(contactSchema.parse(contact))).toEqual({ ...contact, phone: "+16155550134" });
  });
});
