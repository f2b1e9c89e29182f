import "./styles/app.css";
import { QueryClientProvider } from "@tanstack/react-query";
import { StrictMode } from "react";
import { createRoot } from "react-dom/client";
import { RouterProvider } from "react-router-dom";
import { Announcer } from "./components/announcer.tsx";
import { queryClient } from "./lib/query-client.ts";
import { sessionQuery } from "./lib/session.ts";
import { router } from "./router.tsx";

void queryClient.prefetchQuery(sessionQuery);

const root = document.getElementById("root");
if (root === null) throw new Error("index.html has no element with the id root");

createRoot(root).render(
  <StrictMode>
    <QueryClientProvider client={queryClient}>
      <Announcer>
        <RouterProvider router={router} />
      </Announcer>
    </QueryClientProvider>
  </StrictMode>,
);
