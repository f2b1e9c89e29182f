import { Button } from "#web/components/button.tsx";
import type { Role } from "#shared/contracts/person.ts";
import type { SignInRequest } from "#shared/contracts/account.ts";
import type { DemoView } from "#shared/contracts/session.ts";

const does: Record<Role, string> = {
  customer: "buys and follows blocks",
  dealer: "buys for a business",
  planner: "accepts and declines orders",
  floor: "reads the orders of the shop",
  office: "does all of that, and reads the mail",
};

interface DemoAccountsProps {
  demo: DemoView;
  onChoose: (account: SignInRequest) => void;
}

/** The accounts of the demonstration; shown nowhere else. */
export function DemoAccounts({ demo: { accounts, password }, onChoose }: DemoAccountsProps) {
  return (
    <section aria-labelledby="demo-accounts" className="max-w-form">
      <h2 id="demo-accounts" className="text-xl">
        Accounts of the demonstration
      </h2>
      <p className="text-iron">
        The password of each is <span className="font-medium text-ink">{password}</span>
      </p>
      <ul className="mt-3 border-t border-rule">
        {accounts.map(({ role, email }) => (
          <li key={role} className="flex items-center justify-between gap-4 border-b border-rule py-1.5">
            <div className="min-w-0">
              <p className="break-words">{email}</p>
              <p className="text-sm text-iron">{does[role]}</p>
            </div>
            <Button
              aria-label={`Fill in ${email}`}
              onClick={() => {
                onChoose({ email, password });
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
