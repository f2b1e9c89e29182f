import { randomUUID } from "node:crypto";
import { existsSync, readFileSync, renameSync, writeFileSync } from "node:fs";
import { z } from "zod";
import { messageSchema, type Control, type ControlMode, type StoredMessage } from "./message.ts";

type Received = Omit<StoredMessage, "id" | "copies" | "receivedAt">;

/** The messages that came in, oldest first, written to the state file before the sender gets its answer. */
export class Mailbox {
  private messages: StoredMessage[] = [];
  private behaviour: Control = { mode: "accept" };

  constructor(private readonly stateFile: string | undefined) {
    if (stateFile !== undefined && existsSync(stateFile)) {
      this.messages = z.array(messageSchema).parse(JSON.parse(readFileSync(stateFile, "utf8")));
    }
  }

  list(to?: string): StoredMessage[] {
    if (to === undefined) return this.messages;
    const wanted = to.toLowerCase();
    return this.messages.filter((message) => message.to.some((address) => address.toLowerCase() === wanted));
  }

  find(id: string): StoredMessage | undefined {
    return this.messages.find((message) => message.id === id);
  }

  add(received: Received): void {
    const known = this.messages.find((message) => message.messageId === received.messageId);
    if (known === undefined) {
      this.messages.push({ ...received, id: randomUUID(), receivedAt: new Date().toISOString(), copies: 1 });
    } else {
      known.copies += 1;
    }
    this.save();
  }

  clear(): void {
    this.messages = [];
    this.save();
  }

  control(behaviour: Control): void {
    this.behaviour = behaviour;
  }

  /** What to do with the message that comes now; counts it. */
  takeMode(): ControlMode {
    const { mode, times } = this.behaviour;
    if (times !== undefined) this.behaviour = times > 1 ? { mode, times: times - 1 } : { mode: "accept" };
    return mode;
  }

  private save(): void {
    if (this.stateFile === undefined) return;
    const temporary = `${this.stateFile}.writing`;
    writeFileSync(temporary, JSON.stringify(this.messages), { mode: 0o600 });
    renameSync(temporary, this.stateFile);
  }
}
