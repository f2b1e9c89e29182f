import { Outlet } from "react-router-dom";
import { PlaceFrame } from "./place-frame.tsx";

const entries = [
  { name: "Overview", to: "/office", exact: true },
  { name: "Messages", to: "/office/messages" },
];

/** The Office: the shop's managers. */
export function OfficeLayout() {
  return (
    <PlaceFrame place="Office" home="/office" entries={entries}>
      <Outlet />
    </PlaceFrame>
  );
}
