interface LinkedBuild {
  specCode: string;
  numbers: Record<string, string>;
}

/** The address that opens a build again at its review, with its typed numbers and engraving. */
export function buildReviewLink({ specCode, numbers }: LinkedBuild, engraving = ""): string {
  const search = new URLSearchParams({ spec: specCode });
  for (const [id, text] of Object.entries(numbers)) search.set(`n.${id}`, text);
  if (engraving !== "") search.set("engraving", engraving);
  return `/build/review?${search.toString()}`;
}
