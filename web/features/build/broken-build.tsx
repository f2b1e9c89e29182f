import { Notice } from "#web/components/notice.tsx";
import { useBuildDesk } from "./build-desk.tsx";
import { MendButton } from "./closed-option.tsx";

/**
 * A build that came by a link and breaks stop rules as it stands: which, and the smallest change that makes it whole, its
 * family kept. Nothing for a build that can be made.
 */
export function BrokenBuild() {
  const { current, build, evaluation } = useBuildDesk();
  const stops = evaluation.findings.filter(({ severity }) => severity === "stop");
  if (stops.length === 0) return null;
  const held = ["family", ...current.catalogue.choices.map(({ id }) => id)].find(
    (choice) => build.answers[choice] !== undefined,
  );
  const option = held === undefined ? undefined : build.answers[held];
  return (
    <Notice kind="stop" title="The build cannot be made as it stands">
      <ul>
        {stops.map(({ rule, sentence }) => (
          <li key={rule}>{sentence}</li>
        ))}
      </ul>
      {held !== undefined && option !== undefined && (
        <div className="mt-2">
          <MendButton choice={held} option={option} lead="" />
        </div>
      )}
    </Notice>
  );
}
