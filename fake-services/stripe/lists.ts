import { noSuchRecord } from "./errors.ts";

interface ListRequest {
  limit?: number | undefined;
  starting_after?: string | undefined;
  ending_before?: string | undefined;
}

export interface ListPage<Item> {
  object: "list";
  data: Item[];
  has_more: boolean;
  url: string;
}

/** One page of a list. `items` come in the order in which the list shows them. */
export function listPage<Item extends { id: string }>(
  items: Item[],
  request: ListRequest,
  url: string,
): ListPage<Item> {
  const limit = request.limit ?? 10;
  if (request.ending_before !== undefined) {
    const before = items.slice(0, placeOf(items, request.ending_before, "ending_before"));
    const data = before.slice(-limit);
    return { object: "list", data, has_more: data.length < before.length, url };
  }
  const rest =
    request.starting_after === undefined
      ? items
      : items.slice(placeOf(items, request.starting_after, "starting_after") + 1);
  return { object: "list", data: rest.slice(0, limit), has_more: rest.length > limit, url };
}

/** Records that come newest first, as the API lists them. */
export function newestFirst<Item>(records: Record<string, Item>): Item[] {
  return Object.values(records).reverse();
}

function placeOf(items: { id: string }[], id: string, param: string): number {
  const place = items.findIndex((item) => item.id === id);
  if (place < 0) throw noSuchRecord("record", id, param);
  return place;
}
