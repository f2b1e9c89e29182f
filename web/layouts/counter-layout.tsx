import type { ReactNode } from "react";
import { Outlet } from "react-router-dom";
import { PlaceFrame } from "./place-frame.tsx";

const entries = [
  { name: "Blocks", to: "/families" },
  { name: "Start a build", to: "/build" },
];

/** The frame of the Counter around anything, such as an error page. */
export function CounterFrame({ children }: { children: ReactNode }) {
  return (
    <PlaceFrame place={null} home="/" entries={entries} withCart>
      {children}
    </PlaceFrame>
  );
}

/** The Counter: open to anyone. */
export function CounterLayout() {
  return (
    <CounterFrame>
      <Outlet />
    </CounterFrame>
  );
}
