import { z } from "zod";
import type { Endpoint } from "./endpoint.ts";
import { noSuchRecord } from "./errors.ts";
import { listPage, newestFirst } from "./lists.ts";
import { integer, listParameters, parseParameters, text } from "./parameters.ts";

const listOfEvents = z.strictObject({
  ...listParameters,
  type: text.optional(),
  types: z.array(text).max(20).optional(),
  created: z.strictObject({ gte: integer.optional(), lte: integer.optional() }).optional(),
});

export const eventEndpoints: Endpoint[] = [
  {
    method: "get",
    path: "/events",
    run(work, { parameters }) {
      const request = parseParameters(listOfEvents, parameters);
      const types = request.types ?? (request.type === undefined ? undefined : [request.type]);
      const events = newestFirst(work.state.events).filter(
        (event) =>
          (types === undefined || types.includes(event.type)) &&
          event.created >= (request.created?.gte ?? 0) &&
          event.created <= (request.created?.lte ?? Infinity),
      );
      return listPage(events, request, "/v1/events");
    },
  },
  {
    method: "get",
    path: "/events/:id",
    run(work, { id, parameters }) {
      parseParameters(z.strictObject({}), parameters);
      const event = work.state.events[id];
      if (event === undefined) throw noSuchRecord("event", id);
      return event;
    },
  },
];
