/** Whether the last digit is the check digit of the others (ISO/IEC 7812-1, Annex B). */
export function passesLuhn(number: string): boolean {
  if (!/^\d{2,19}$/.test(number)) return false;
  const sum = [...number].reverse().reduce((total, digit, place) => {
    const value = Number(digit) * (place % 2 === 1 ? 2 : 1);
    return total + (value > 9 ? value - 9 : value);
  }, 0);
  return sum % 10 === 0;
}
