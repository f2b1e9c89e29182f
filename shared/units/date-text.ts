const months = [
  "January",
  "February",
  "March",
  "April",
  "May",
  "June",
  "July",
  "August",
  "September",
  "October",
  "November",
  "December",
];

/** "12 May 2027" of an ISO date; a calendar date has no time zone. */
export function longDate(iso: string): string {
  const [year = "", month = "", day = ""] = iso.split("-");
  return `${Number(day)} ${months[Number(month) - 1] ?? month} ${year}`;
}
