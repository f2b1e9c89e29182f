import { workCentreSchema, type Catalogue, type WorkCentre } from "./catalogue.ts";

/** Work that one block asks for. */
export interface BuildWork {
  /** Whole minutes at each work centre. */
  minutes: Partial<Record<WorkCentre, number>>;
  /** Longest lead of the family and the options, calendar days. */
  leadDays: number;
}

/**
 * Work of one block as answered so far (choice id -> option id): the family's minutes plus those of the options that exist in it,
 * and the longest lead. Nothing without a family.
 */
export function workOf(catalogue: Catalogue, answers: Readonly<Record<string, string>>): BuildWork {
  const family = catalogue.families.find(({ id }) => id === answers["family"]);
  if (family === undefined) return { minutes: {}, leadDays: 0 };
  const minutes = { ...family.minutes };
  let { leadDays } = family;
  for (const choice of catalogue.choices) {
    const option = choice.options.find(({ id }) => id === answers[choice.id]);
    if (option === undefined || option.families?.includes(family.id) === false) continue;
    leadDays = Math.max(leadDays, option.leadDays);
    for (const centre of workCentreSchema.options) {
      const more = option.minutes[centre];
      if (more !== undefined) minutes[centre] = (minutes[centre] ?? 0) + more;
    }
  }
  return { minutes, leadDays };
}
