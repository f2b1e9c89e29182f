import { Outlet } from "react-router-dom";
import { PlaceFrame } from "./place-frame.tsx";

const entries = [{ name: "Orders", to: "/floor" }];

/** The Floor: large targets, night shift unless the reader chose otherwise. */
export function FloorLayout() {
  return (
    <PlaceFrame place="Floor" home="/floor" entries={entries} onFloor>
      <Outlet />
    </PlaceFrame>
  );
}
