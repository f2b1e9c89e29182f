import { OutsideLink } from "#web/components/text-link.tsx";
import { telephone } from "#web/lib/format.ts";
import { usStates } from "#shared/contracts/address.ts";
import type { OrderView } from "#shared/contracts/orders.ts";

/** Where the order goes, and who ordered it. */
export function OrderPeople({ order }: { order: OrderView }) {
  const { contact } = order;
  return (
    <dl className="space-y-4">
      <div>
        <dt className="cell-label">{order.delivery.method === "freight" ? "Freight to" : "Delivery"}</dt>
        <dd>
          <Destination order={order} />
        </dd>
      </div>
      <div>
        <dt className="cell-label">Ordered by</dt>
        <dd className="break-words">
          {contact.name}
          <br />
          <OutsideLink href={`mailto:${contact.email}`}>{contact.email}</OutsideLink>
          <br />
          <OutsideLink href={`tel:${contact.phone}`}>{telephone(contact.phone)}</OutsideLink>
        </dd>
      </div>
    </dl>
  );
}

function Destination({ order: { delivery, contact } }: { order: OrderView }) {
  if (delivery.method === "pick-up") return <>Picked up at the shop</>;
  const { line1, line2, city, state, postalCode } = delivery.address;
  const lines = [contact.name, line1, line2, `${city}, ${usStates[state]} ${postalCode}`].filter(
    (line) => line !== "",
  );
  return (
    <address className="not-italic">
      {lines.map((line) => (
        <span key={line} className="block">
          {line}
        </span>
      ))}
    </address>
  );
}
