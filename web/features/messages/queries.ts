import { keepPreviousData, queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import {
  messageListQuerySchema,
  messageListSchema,
  messageSchema,
  type MessageListQuery,
} from "#shared/contracts/messages.ts";
import { api } from "#web/lib/api.ts";

/** What the address bar of the list asks for; what cannot be read falls back to its default. */
export function readMessagesAddress(search: URLSearchParams): MessageListQuery {
  const { state, search: words, page } = messageListQuerySchema.shape;
  return {
    state: state.catch(undefined).parse(search.get("state") ?? undefined),
    search: words.catch("").parse(search.get("search") ?? undefined),
    page: page.catch(1).parse(search.get("page") ?? undefined),
  };
}

const listsKey = ["messages", "list"];

export function messageListQuery(query: MessageListQuery) {
  const search = new URLSearchParams({ search: query.search, page: String(query.page) });
  if (query.state !== undefined) search.set("state", query.state);
  return queryOptions({
    queryKey: [...listsKey, query],
    queryFn: ({ signal }) => api.get(`/api/messages?${search.toString()}`, messageListSchema, { signal }),
    placeholderData: keepPreviousData,
    refetchInterval: 30_000,
  });
}

const soon = 5_000;

/** One message; while it waits to go out it is looked at again every few seconds. */
export function messageQuery(id: string) {
  return queryOptions({
    queryKey: ["messages", "one", id],
    queryFn: ({ signal }) => api.get(`/api/messages/${encodeURIComponent(id)}`, messageSchema, { signal }),
    refetchInterval: (query) => (query.state.data?.state === "waiting" ? soon : false),
  });
}

export function useSendAgain(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () =>
      api.post(`/api/messages/${encodeURIComponent(id)}/send-again`, undefined, messageSchema),
    onSuccess: (message) => {
      client.setQueryData(messageQuery(id).queryKey, message);
      void client.invalidateQueries({ queryKey: listsKey });
    },
  });
}
