import { useFormContext, useWatch } from "react-hook-form";
import { CautionLine } from "#web/components/caution-line.tsx";
import { RadioGroup } from "#web/components/radio-group.tsx";
import { Select } from "#web/components/select.tsx";
import { TextField } from "#web/components/text-field.tsx";
import { useSession } from "#web/lib/session.ts";
import { usStates } from "#shared/contracts/address.ts";
import type { CheckoutAnswers, CheckoutFields } from "./checkout-fields.ts";

const states = Object.entries(usStates).map(([value, label]) => ({ value, label }));

/** Freight to an address, or pick-up at the shop. */
export function DeliveryFields({ messageOf }: { messageOf: (path: string) => string | undefined }) {
  const { register, control } = useFormContext<CheckoutFields, unknown, CheckoutAnswers>();
  const method = useWatch({ control, name: "delivery.method" });
  const shop = useSession()?.shop;
  return (
    <>
      <RadioGroup
        {...register("delivery.method")}
        label="How the blocks leave the shop"
        error={messageOf("delivery.method")}
        options={[
          { value: "freight", label: "By freight, on a pallet", hint: "To an address in the United States" },
          {
            value: "pick-up",
            label: "Picked up at the shop",
            hint: shop === undefined ? undefined : shop.addressLines.join(", "),
          },
        ]}
      />
      {method === "freight" ? (
        <>
          <TextField
            {...register("delivery.address.line1")}
            label="Street and number"
            autoComplete="address-line1"
            error={messageOf("delivery.address.line1")}
          />
          <TextField
            {...register("delivery.address.line2")}
            label="Unit, building or dock"
            optional
            autoComplete="address-line2"
            error={messageOf("delivery.address.line2")}
          />
          <TextField
            {...register("delivery.address.city")}
            label="City"
            autoComplete="address-level2"
            error={messageOf("delivery.address.city")}
          />
          <Select
            {...register("delivery.address.state")}
            label="State"
            placeholder="Choose a state"
            options={states}
            autoComplete="address-level1"
            error={messageOf("delivery.address.state")}
          />
          <TextField
            {...register("delivery.address.postalCode")}
            label="ZIP code"
            inputMode="numeric"
            autoComplete="postal-code"
            className="max-w-40"
            error={messageOf("delivery.address.postalCode")}
          />
          <CautionLine>
            The pallet has to be unloaded where it arrives: have a fork truck, a hoist or a lift gate ready.
          </CautionLine>
        </>
      ) : (
        <CautionLine>
          Bring a truck or trailer that can carry the weight, and straps. The shop loads; you tie down.
        </CautionLine>
      )}
    </>
  );
}
