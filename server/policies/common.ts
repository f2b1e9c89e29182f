import { definePolicy } from "./policy.ts";

/** Open to all the world: no person, no record. */
export const anyone = definePolicy({ action: "public", others: "anyone" });

/** Something of one's own account. */
export const ownAccount = definePolicy({ action: "account.own", others: "signed-in" });

export const readMessages = definePolicy({ action: "messages.read", roles: ["office"] });
export const sendMessages = definePolicy({ action: "messages.send", roles: ["office"] });
