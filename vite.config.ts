import tailwindcss from "@tailwindcss/vite";
import react from "@vitejs/plugin-react";
import { defineConfig } from "vitest/config";

const onDatabase = ["./tests/support/global-setup.ts"];

/** In development the client's own server stands in front and hands these to the product's server. */
const serverOrigin = process.env["SERVER_ORIGIN"] ?? "http://127.0.0.1:4701";
const serverPaths = ["/api", "/order-link", "/healthz", "/readyz"];

export default defineConfig({
  plugins: [react(), tailwindcss()],
  publicDir: "web/public",
  server: {
    proxy: Object.fromEntries(serverPaths.map((path) => [path, { target: serverOrigin }])),
    // What tests and the running shop write is no reason to reload.
    watch: { ignored: ["**/.data/**", "**/dist/**", "**/tests/**", "**/server/**"] },
  },
  build: {
    outDir: "dist",
    emptyOutDir: true,
    // The content security policy allows files of our own only: nothing is inlined, neither script nor font.
    assetsInlineLimit: 0,
    modulePreload: { polyfill: false },
  },
  test: {
    maxWorkers: 2,
    projects: [
      {
        test: {
          name: "shared",
          include: ["tests/shared/**/*.test.ts", "tests/reference/**/*.test.ts"],
          environment: "node",
        },
      },
      {
        extends: true,
        test: {
          name: "web",
          include: ["tests/web/**/*.test.{ts,tsx}"],
          environment: "jsdom",
        },
      },
      {
        test: {
          name: "server",
          include: ["tests/server/**/*.test.ts", "tests/fake-services/**/*.test.ts"],
          pool: "forks",
          globalSetup: onDatabase,
          setupFiles: ["./tests/support/end-of-file.ts", "./tests/support/server-environment.ts"],
          testTimeout: 20_000,
          hookTimeout: 60_000,
        },
      },
      {
        test: {
          name: "faults",
          include: ["tests/faults/**/*.test.ts"],
          pool: "forks",
          globalSetup: onDatabase,
          setupFiles: ["./tests/support/end-of-file.ts", "./tests/support/server-environment.ts"],
          testTimeout: 60_000,
          hookTimeout: 60_000,
        },
      },
      {
        test: {
          name: "browser",
          include: ["tests/browser/**/*.test.ts"],
          pool: "forks",
          globalSetup: [...onDatabase, "./tests/support/web-build.ts"],
          setupFiles: ["./tests/support/end-of-file.ts"],
          env: { SERVE_WEB: "dist" },
          testTimeout: 90_000,
          hookTimeout: 90_000,
          // A browser, a server and the fakes fill the machine: one file at a time, after all others.
          maxWorkers: 1,
          sequence: { groupOrder: 1 },
        },
      },
      {
        test: {
          name: "start",
          include: ["tests/start/**/*.test.ts"],
          pool: "forks",
          setupFiles: ["./tests/support/end-of-file.ts"],
          testTimeout: 60_000,
          hookTimeout: 60_000,
        },
      },
    ],
  },
});
