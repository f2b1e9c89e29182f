import { useAnnounce } from "#web/components/announcer.tsx";
import { Button } from "#web/components/button.tsx";
import { Notice } from "#web/components/notice.tsx";
import { RequestFault } from "#web/components/request-fault.tsx";
import { TextLink } from "#web/components/text-link.tsx";
import { TitleBlock } from "#web/components/title-block.tsx";
import { dateTime } from "#web/lib/format.ts";
import type { MessageView } from "#shared/contracts/messages.ts";
import { MessageStateTag } from "./message-state-tag.tsx";
import { useSendAgain } from "./queries.ts";

interface MessageDetailProps {
  message: MessageView;
  timeZone: string;
}

/** One e-mail: where it stands, why it is held up, its text, and the button that sends it again. */
export function MessageDetail({ message, timeZone }: MessageDetailProps) {
  const announce = useAnnounce();
  const sendAgain = useSendAgain(message.id);
  const send = () => {
    sendAgain.mutate(undefined, {
      onSuccess: () => {
        announce(`The message to ${message.to} is on its way again.`);
      },
    });
  };
  return (
    <div className="space-y-6">
      <TitleBlock
        label="Message"
        cells={[
          { label: "To", value: message.to, wide: true },
          { label: "State", value: <MessageStateTag message={message} /> },
          { label: "Written", value: dateTime(message.createdAt, timeZone) },
          { label: "Sent", value: message.sentAt === null ? "\u2013" : dateTime(message.sentAt, timeZone) },
          { label: "Attempts", value: String(message.attempts) },
          {
            label: "Order",
            value:
              message.orderNumber === null ? (
                "\u2013"
              ) : (
                <TextLink to={`/floor/orders/${message.orderNumber}`}>{message.orderNumber}</TextLink>
              ),
          },
        ]}
      />
      {message.state === "waiting" && message.lastError !== null && (
        <Notice kind="caution" title="The mail server did not take it; it is tried again by itself">
          <p className="break-words">{message.lastError}</p>
        </Notice>
      )}
      {sendAgain.isError && <RequestFault error={sendAgain.error} />}
      {sendAgain.isSuccess && (
        <Notice kind="pass" title="On its way again">
          Any link in it is made anew; the one before it ends.
        </Notice>
      )}
      <div>
        <Button busy={sendAgain.isPending} busyLabel="Sending" onClick={send}>
          Send again
        </Button>
      </div>
      <section aria-labelledby="text">
        <h2 id="text" className="mb-2 text-xl">
          Text
        </h2>
        <p className="mb-2 text-sm text-iron">
          Links are masked: they open what belongs to the receiver alone.
        </p>
        <div className="max-w-3xl border border-edge bg-sheet p-5 break-words whitespace-pre-wrap">
          {message.text}
        </div>
      </section>
    </div>
  );
}
