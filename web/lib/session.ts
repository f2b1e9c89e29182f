import { queryOptions, useQuery, useQueryClient } from "@tanstack/react-query";
import type { Role } from "#shared/contracts/person.ts";
import type { SessionView } from "#shared/contracts/session.ts";
import { api, rememberCsrfToken } from "./api.ts";

/** Who is here, how many blocks are in the cart, and the shop's own name and address. */
export const sessionQuery = queryOptions({
  queryKey: ["session"],
  staleTime: 60_000,
  // Never cancelled: a guard may wait for the answer while the screen that asked first goes away.
  queryFn: async (): Promise<SessionView> => {
    const { sessionSchema } = await import("#shared/contracts/session.ts");
    const session = await api.get("/api/session", sessionSchema);
    rememberCsrfToken(session.csrfToken);
    return session;
  },
});

/** The session as last read; undefined until the first answer. */
export function useSession(): SessionView | undefined {
  return useQuery(sessionQuery).data;
}

/**
 * Reads the session again: after the cart changed.
 * After signing in or out use `startAnew`, which also forgets what the person before could see.
 */
export function useRefreshSession(): () => Promise<void> {
  const client = useQueryClient();
  return () => client.invalidateQueries({ queryKey: sessionQuery.queryKey });
}

/** After signing in or out: forgets everything that was read as somebody else, then reads the session. */
export function useStartAnew(): () => Promise<void> {
  const client = useQueryClient();
  return async () => {
    rememberCsrfToken(null);
    client.removeQueries({ predicate: (query) => query.queryKey[0] !== sessionQuery.queryKey[0] });
    await client.fetchQuery({ ...sessionQuery, staleTime: 0 });
  };
}

export type Place = "floor" | "office";

const placeRoles: Record<Place, readonly Role[]> = {
  floor: ["floor", "planner", "office"],
  office: ["office"],
};

/** Whether the role may enter the place; the server decides for every record, this only spares a walk to a closed door. */
export function mayEnter(place: Place, role: Role): boolean {
  return placeRoles[place].includes(role);
}
