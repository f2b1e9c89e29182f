import { Button } from "#web/components/button.tsx";
import { Notice } from "#web/components/notice.tsx";
import { RequestFault } from "#web/components/request-fault.tsx";
import { StatusTag } from "#web/components/status-tag.tsx";
import { TitleBlock } from "#web/components/title-block.tsx";
import type { PersonView, Role } from "#shared/contracts/person.ts";
import { useResendVerification } from "./queries.ts";

const roleNames: Record<Role, string> = {
  customer: "Customer",
  dealer: "Dealer",
  planner: "Planner",
  floor: "Floor",
  office: "Office",
};

/** Who one is here, and whether the e-mail address is confirmed. */
export function OwnDetails({ person }: { person: PersonView }) {
  const resend = useResendVerification();
  return (
    <div className="space-y-4">
      <TitleBlock
        label="Account"
        cells={[
          { label: "Name", value: person.name, wide: true },
          { label: "E-mail", value: person.email, wide: true },
          {
            label: "E-mail address",
            value: person.emailVerified ? (
              <StatusTag kind="pass">Confirmed</StatusTag>
            ) : (
              <StatusTag kind="caution">Not confirmed</StatusTag>
            ),
          },
          { label: "Role", value: roleNames[person.role] },
        ]}
      />
      {!person.emailVerified && !resend.isSuccess && (
        <Notice
          kind="caution"
          title="Your e-mail address is not confirmed yet"
          action={
            <Button
              busy={resend.isPending}
              busyLabel="Sending"
              onClick={() => {
                resend.mutate();
              }}
            >
              Send the link again
            </Button>
          }
        >
          Open the link in the message that was sent to {person.email}. Orders that were placed as a guest
          with this address appear once it is confirmed.
        </Notice>
      )}
      {resend.isSuccess && (
        <Notice kind="pass" live>
          The link is on its way to {person.email}.
        </Notice>
      )}
      {resend.isError && <RequestFault error={resend.error} />}
    </div>
  );
}
