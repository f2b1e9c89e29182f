import { PageHeading } from "#web/components/page-heading.tsx";
import { TextLink } from "#web/components/text-link.tsx";
import { OrderLinkForm } from "#web/features/orders/order-link-form.tsx";
import { useSession } from "#web/lib/session.ts";

export function Component() {
  const session = useSession();
  return (
    <div className="space-y-8">
      <PageHeading
        title="This link no longer opens an order"
        lead="It has ended, or a newer one took its place. The order itself is kept; have a new link sent to the e-mail address that was given with it."
      />
      <p>
        Placed with an account?{" "}
        {(session?.person ?? null) === null ? (
          <TextLink to="/account/sign-in?next=%2Faccount%2Forders">Sign in</TextLink>
        ) : (
          <TextLink to="/account/orders">My orders</TextLink>
        )}
      </p>
      <OrderLinkForm orderNumber="" />
    </div>
  );
}
