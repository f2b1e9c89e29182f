const alphabet = "0123456789ABCDEFGHJKMNPQRSTVWXYZ";

/** Position of a Crockford base 32 character, look-alikes accepted; -1 when it is none. */
function valueOf(character: string): number {
  const upper = character.toUpperCase();
  const same = upper === "O" ? "0" : upper === "I" || upper === "L" ? "1" : upper;
  return alphabet.indexOf(same);
}

/** The eighth character: weights 1 to 7, modulo 31, so that one wrong character or a swap of neighbours is seen. */
function checkCharacter(values: readonly number[]): string {
  const sum = values.reduce((total, value, index) => total + value * (index + 2), 0);
  return alphabet.charAt(sum % 31);
}

/**
 * An order number: seven random characters and a check character, "K7Q4-M2XD". It tells nobody how much is sold.
 * @param random seven numbers from 0 to 30, from a secure source (31 values, so that the check finds every slip)
 */
export function makeOrderNumber(random: readonly number[]): string {
  if (random.length !== 7 || random.some((value) => !Number.isInteger(value) || value < 0 || value > 30)) {
    throw new RangeError("An order number is made of seven whole numbers from 0 to 30.");
  }
  const text = random.map((value) => alphabet.charAt(value)).join("") + checkCharacter(random);
  return `${text.slice(0, 4)}-${text.slice(4)}`;
}

/** Reads an order number as a person types it; null when it is none (wrong length, character or check). */
export function readOrderNumber(text: string): string | null {
  const values = [...text.replace(/[\s-]/g, "")].map(valueOf);
  if (values.length !== 8 || values.some((value) => value < 0 || value > 30)) return null;
  const number = makeOrderNumber(values.slice(0, 7));
  return number.endsWith(alphabet.charAt(values[7] ?? 0)) ? number : null;
}
