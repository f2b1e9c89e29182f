import { Navigate } from "react-router-dom";
import { stepPath } from "#web/features/build/build-address.ts";
import { useBuildDesk } from "#web/features/build/build-desk.tsx";

/** `/build`: on to the first step, with the build that the address carries. */
export function Component() {
  const { current, search } = useBuildDesk();
  return <Navigate replace to={{ pathname: stepPath(current.catalogue.steps[0]?.id ?? "review"), search }} />;
}
