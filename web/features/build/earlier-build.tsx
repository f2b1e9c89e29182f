import { useState } from "react";
import { Notice } from "#web/components/notice.tsx";
import { TextLink } from "#web/components/text-link.tsx";
import { useBuildDesk } from "./build-desk.tsx";
import { buildInProgress } from "./build-in-progress.ts";

/** On a fresh sheet: the way back to the build that was worked on before, until the first answer takes its place. */
export function EarlierBuild() {
  const { search, undo, redo } = useBuildDesk();
  const [earlier] = useState(buildInProgress);
  if (earlier === null || search !== "" || undo !== null || redo !== null) return null;
  return (
    <Notice
      kind="note"
      action={
        <TextLink to={earlier} className="inline-flex min-h-6 items-center">
          Go on with it
        </TextLink>
      }
    >
      Another build is in progress in this tab.
    </Notice>
  );
}
