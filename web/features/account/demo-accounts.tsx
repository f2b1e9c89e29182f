import { Button } from "#web/components/button.tsx";
import type { Role } from "#shared/contracts/person.ts";
import type { SignInRequest } from "#shared/contracts/account.ts";

const password = "osier-creek-demo";

const accounts: { role: Role; does: string }[] = [
  { role: "customer", does: "buys and follows blocks" },
  { role: "dealer", does: "buys for a business" },
  { role: "planner", does: "accepts and declines orders" },
  { role: "floor", does: "reads the orders of the shop" },
  { role: "office", does: "does all of that, and reads the mail" },
];

/** The accounts of the demonstration; shown nowhere else. */
export function DemoAccounts({ onChoose }: { onChoose: (account: SignInRequest) => void }) {
  return (
    <section aria-labelledby="demo-accounts" className="max-w-form">
      <h2 id="demo-accounts" className="text-xl">
        Accounts of the demonstration
      </h2>
      <p className="text-iron">
        The password of each is <span className="font-medium text-ink">{password}</span>
      </p>
      <ul className="mt-3 border-t border-rule">
        {accounts.map(({ role, does }) => (
          <li key={role} className="flex items-center justify-between gap-4 border-b border-rule py-1.5">
            <div className="min-w-0">
              <p className="break-words">{role}@osiercreek.example</p>
              <p className="text-sm text-iron">{does}</p>
            </div>
            <Button
              aria-label={`Fill in ${role}@osiercreek.example`}
              onClick={() => {
                onChoose({ email: `${role}@osiercreek.example`, password });
              }}
            >
              Fill in
            </Button>
          </li>
        ))}
      </ul>
    </section>
  );
}
