import { resolve } from "node:path";
import express, { type RequestHandler, Router } from "express";
import { Refusal } from "#server/services/refusal.ts";

const YEAR = 365 * 24 * 3600;

/**
 * The built client: files with a hash in their name are kept for good, the page itself is asked for each time and
 * answers every address that is not a file, for the client's own router.
 */
export function clientRouter(folder: string): Router {
  const root = resolve(folder);
  const router = Router();
  router.use(
    "/assets",
    express.static(resolve(root, "assets"), { immutable: true, maxAge: YEAR * 1000, index: false }),
    noSuchFile,
  );
  router.use(express.static(root, { index: false, cacheControl: true, maxAge: "1h" }));
  router.get("/{*path}", (request, response, next) => {
    // A missing file is a missing file; only pages are the client's.
    if (/\.[a-z0-9]{2,5}$/i.test(request.path)) {
      noSuchFile(request, response, next);
      return;
    }
    if (response.getHeader("Cache-Control") === undefined) response.setHeader("Cache-Control", "no-cache");
    response.sendFile(resolve(root, "index.html"), { cacheControl: false });
  });
  return router;
}

const noSuchFile: RequestHandler = () => {
  throw new Refusal("not-found", "There is no such file.");
};
