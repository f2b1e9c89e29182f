import { useQuery } from "@tanstack/react-query";
import type { Build } from "#shared/catalogue/build.ts";
import { searchToBuild } from "#shared/catalogue/build-address.ts";
import type { Catalogue } from "#shared/catalogue/catalogue.ts";
import type { SpecProblem } from "#shared/catalogue/spec-code.ts";
import type { CurrentCatalogue } from "#shared/contracts/catalogue.ts";
import { ButtonLink } from "#web/components/button.tsx";
import { Notice } from "#web/components/notice.tsx";
import { PageHeading } from "#web/components/page-heading.tsx";
import { Skeleton } from "#web/components/skeleton.tsx";
import { earlierCatalogueQuery } from "#web/lib/catalogue.ts";
import { searchOf } from "./build-address.ts";
import { choiceName, optionName } from "./build-words.ts";
import { SpecCodeField } from "./spec-code-field.tsx";

interface SpecTroubleProps {
  current: CurrentCatalogue;
  trouble: SpecProblem;
  search: string;
}

/** A spec code that cannot be opened as it stands: what is wrong with it, and the ways on. */
export function SpecTrouble({ current, trouble, search }: SpecTroubleProps) {
  const code = new URLSearchParams(search).get("spec") ?? "";
  const earlier = trouble.problem === "version" && trouble.version < current.catalogue.version;
  return (
    <div className="max-w-text space-y-8">
      <PageHeading
        title={earlier ? "This build is from an earlier catalogue" : "This spec code cannot be opened"}
        over="Build"
      />
      {trouble.problem === "version" && earlier ? (
        <EarlierBuild current={current} version={trouble.version} search={search} />
      ) : (
        <Notice kind="stop">{trouble.sentence}</Notice>
      )}
      <SpecCodeField given={code} />
      <p>
        <ButtonLink to="/build">Start a new build</ButtonLink>
      </p>
    </div>
  );
}

interface EarlierBuildProps {
  current: CurrentCatalogue;
  version: number;
  search: string;
}

function EarlierBuild({ current, version, search }: EarlierBuildProps) {
  const earlier = useQuery(earlierCatalogueQuery(version));
  if (earlier.isPending) return <Skeleton lines={3} label="Looking for the earlier catalogue" />;
  if (earlier.data === undefined) {
    return (
      <Notice kind="stop">
        The code was made with catalogue {version}, which the shop does not have at hand.
      </Notice>
    );
  }
  const read = searchToBuild(earlier.data, new URLSearchParams(search));
  if (read.spec !== null) return <Notice kind="stop">{read.spec.sentence}</Notice>;
  const { build, lost } = carriedOver(current.catalogue, read.build);
  const next = searchOf(current.catalogue, build, read.engraving ?? "", search);
  return (
    <Notice
      kind="caution"
      title={`It was made with catalogue ${version}; today's is ${current.catalogue.version}.`}
      action={
        <ButtonLink to={{ pathname: "/build", search: next }}>Open it with today&apos;s catalogue</ButtonLink>
      }
    >
      {lost.length === 0 ? (
        <p>All of its answers are still made. Prices and rules are today&apos;s.</p>
      ) : (
        <p>
          Not made any more, and left unanswered:{" "}
          {lost
            .map(
              ({ choice, option }) =>
                `${choiceName(earlier.data, choice)}: ${optionName(earlier.data, choice, option)}`,
            )
            .join("; ")}
          . Prices and rules are today&apos;s.
        </p>
      )}
    </Notice>
  );
}

interface CarriedOver {
  build: Build;
  lost: { choice: string; option: string }[];
}

/** What of a build another catalogue still has. */
function carriedOver(catalogue: Catalogue, { answers, numbers, mine }: Build): CarriedOver {
  const kept: Record<string, string> = {};
  const lost: CarriedOver["lost"] = [];
  const family = answers["family"];
  for (const [choice, option] of Object.entries(answers)) {
    const known = catalogue.choices.find(({ id }) => id === choice)?.options.find(({ id }) => id === option);
    if (known === undefined || (family !== undefined && known.families?.includes(family) === false))
      lost.push({ choice, option });
    else kept[choice] = option;
  }
  const asked = new Set(catalogue.numbers.map(({ id }) => id));
  const typed = Object.entries(numbers).filter(([id]) => asked.has(id));
  return {
    build: { answers: kept, numbers: Object.fromEntries(typed), mine: mine.filter((id) => id in kept) },
    lost,
  };
}
