const CAS = /^(\d{2,7})-(\d{2})-(\d)$/;
const EC = /^(\d{3})-(\d{3})-(\d)$/;

/**
 * True for a CAS number whose check digit is right: the digits before it, counted from the
 * right, each times its place, summed, modulo 10 (rule of the Chemical Abstracts Service).
 */
export function isCasNumber(text: string): boolean {
  const match = CAS.exec(text);
  if (!match) return false;
  const digits = [...(match[1]! + match[2]!)].reverse();
  const total = digits.reduce((sum, digit, at) => sum + BigInt(digit) * BigInt(at + 1), 0n);
  return (total % 10n).toString() === match[3];
}

/**
 * True for an EC number whose check digit is right: the first six digits, counted from the
 * left, each times its place, summed, modulo 11 (a remainder of 10 is never issued).
 */
export function isEcNumber(text: string): boolean {
  const match = EC.exec(text);
  if (!match) return false;
  const digits = [...(match[1]! + match[2]!)];
  const total = digits.reduce((sum, digit, at) => sum + BigInt(digit) * BigInt(at + 1), 0n);
  return (total % 11n).toString() === match[3];
}
