import { useState } from "react";
import { useAnnounce } from "#web/components/announcer.tsx";
import { Button, ButtonLink } from "#web/components/button.tsx";
import { CautionLine } from "#web/components/caution-line.tsx";
import { Empty } from "#web/components/empty.tsx";
import { Notice } from "#web/components/notice.tsx";
import { RequestFault } from "#web/components/request-fault.tsx";
import { money, pounds } from "#web/lib/format.ts";
import type { CartLineView, CartView } from "#shared/contracts/cart.ts";
import { CartLine } from "./cart-line.tsx";
import { useChangeQuantity, usePutBack, useRemoveLine } from "./queries.ts";
import { RefusedLines } from "./refused-lines.tsx";

/** The cart: its lines, what they come to, and the way to the checkout. */
export function CartContents({ cart }: { cart: CartView }) {
  const announce = useAnnounce();
  const change = useChangeQuantity();
  const remove = useRemoveLine();
  const putBack = usePutBack();
  const [removed, setRemoved] = useState<CartLineView | null>(null);

  const setQuantity = (line: CartLineView, quantity: number) => {
    change.mutate(
      { id: line.id, quantity },
      {
        onSuccess: (after) => {
          announce(
            `${quantity} ${quantity === 1 ? "block" : "blocks"}; the cart comes to ${money(after.totalCents)}`,
          );
        },
      },
    );
  };
  const takeOut = (line: CartLineView) => {
    remove.mutate(line.id, {
      onSuccess: () => {
        setRemoved(line);
        // The button that had focus is gone with its line.
        document.getElementById("page")?.focus({ preventScroll: true });
      },
    });
  };
  const undo = (line: CartLineView) => {
    putBack.mutate(line, {
      onSuccess: () => {
        setRemoved(null);
        announce(`${line.build.summary} is back in the cart.`);
      },
    });
  };

  const fault = change.error ?? remove.error ?? putBack.error;
  const isEmpty = cart.lines.length === 0 && cart.refused.length === 0;
  return (
    <div className="space-y-8">
      {removed !== null && (
        <Notice
          kind="note"
          live
          title={`${removed.build.summary} was taken out of the cart`}
          action={
            <Button
              busy={putBack.isPending}
              busyLabel="Putting it back"
              onClick={() => {
                undo(removed);
              }}
            >
              Put it back
            </Button>
          }
        />
      )}
      {fault !== null && <RequestFault error={fault} />}
      <RefusedLines
        refused={cart.refused}
        onRemove={(id) => {
          remove.mutate(id);
        }}
      />
      {isEmpty ? (
        <Empty
          title="There is no block in the cart"
          action={
            <ButtonLink to="/build" look={removed === null ? "main" : "secondary"}>
              Start a build
            </ButtonLink>
          }
        >
          Work out a build that is certain to fit, then put it in the cart from its review.
        </Empty>
      ) : (
        <>
          {cart.lines.length > 0 && (
            <ul className="space-y-10" aria-label="Blocks in the cart">
              {cart.lines.map((line) => (
                <CartLine
                  key={line.id}
                  line={line}
                  quantity={
                    change.isPending && change.variables.id === line.id
                      ? change.variables.quantity
                      : line.quantity
                  }
                  onQuantity={(quantity) => {
                    setQuantity(line, quantity);
                  }}
                  onRemove={() => {
                    takeOut(line);
                  }}
                />
              ))}
            </ul>
          )}
          <CartFoot cart={cart} busy={change.isPending || remove.isPending} />
        </>
      )}
    </div>
  );
}

function CartFoot({ cart, busy }: { cart: CartView; busy: boolean }) {
  if (cart.lines.length === 0) return null;
  const weight = cart.lines.reduce((sum, line) => sum + line.build.weight * line.quantity, 0);
  return (
    <section aria-label="Total" className="border-t-4 border-double border-ink pt-5">
      <div className="flex flex-wrap items-start justify-between gap-x-10 gap-y-5">
        <div className="max-w-text space-y-2">
          <CautionLine>
            {cart.blocks === 1
              ? `The bare block weighs ${pounds(weight)}, as much as a person.`
              : `The ${cart.blocks} bare blocks weigh ${pounds(weight)} together.`}{" "}
            Lift with a hoist and a stand rated for it.
          </CautionLine>
          <CautionLine>
            Freight arrives on a pallet; the crate adds to the weight. Plan how it comes off the truck.
          </CautionLine>
        </div>
        <div className="grow space-y-4 sm:grow-0 sm:text-right">
          <p aria-busy={busy || undefined} className={busy ? "opacity-60" : undefined}>
            <span className="cell-label block">
              {cart.blocks === 1 ? "One block" : `${cart.blocks} blocks`}, before freight and tax
            </span>
            <span className="text-2xl numerals">{money(cart.totalCents)}</span>
          </p>
          {cart.refused.length === 0 ? (
            <ButtonLink to="/checkout" look="main" className="w-full sm:w-auto">
              Check out
            </ButtonLink>
          ) : (
            <p className="font-medium text-stop">Mend or remove what cannot be made, then check out.</p>
          )}
        </div>
      </div>
    </section>
  );
}
