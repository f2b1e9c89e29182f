import { col, fn, where } from "sequelize";
import { Person } from "#server/models/person.ts";

/** The person with this address, however its letters are written. */
export function findPersonByEmail(email: string): Promise<Person | null> {
  return Person.findOne({ where: where(fn("lower", col("email")), email.toLowerCase()) });
}
