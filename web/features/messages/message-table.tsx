import type { ReactNode } from "react";
import { DataTable } from "#web/components/data-table.tsx";
import { dateTime } from "#web/lib/format.ts";
import type { MessageSummary } from "#shared/contracts/messages.ts";
import { MessageStateTag } from "./message-state-tag.tsx";

interface MessageTableProps {
  messages: MessageSummary[];
  timeZone: string;
  empty: ReactNode;
}

/** The shop's e-mails, newest first. */
export function MessageTable({ messages, timeZone, empty }: MessageTableProps) {
  return (
    <DataTable
      caption="E-mails, newest first"
      captionHidden
      rows={messages}
      rowId={(message) => message.id}
      rowLink={(message) => `/office/messages/${message.id}`}
      empty={empty}
      columns={[
        { id: "subject", header: "Subject", cell: (message) => message.subject },
        { id: "to", header: "To", cell: (message) => <span className="wrap-anywhere">{message.to}</span> },
        { id: "state", header: "State", cell: (message) => <MessageStateTag message={message} /> },
        {
          id: "order",
          header: "Order",
          cell: (message) => (
            <span className="whitespace-nowrap numerals">{message.orderNumber ?? "\u2013"}</span>
          ),
        },
        { id: "written", header: "Written", cell: (message) => dateTime(message.createdAt, timeZone) },
        {
          id: "sent",
          header: "Sent",
          cell: (message) => (message.sentAt === null ? "\u2013" : dateTime(message.sentAt, timeZone)),
        },
      ]}
    />
  );
}
