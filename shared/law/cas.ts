const CAS = /^(\d{2,7})-(\d{2})-(\d)$/;

/**
 * True for a CAS registry number whose check digit is right: the last digit is the sum of the
 * others, each times its place counted from the right, modulo ten.
 */
export function isCasNumber(text: string): boolean {
  const match = CAS.exec(text);
  if (!match) return false;
  const digits = match[1]! + match[2]!;
  let sum = 0n;
  for (let place = 1; place <= digits.length; place += 1) {
    sum += BigInt(place) * BigInt(digits[digits.length - place]!);
  }
  return sum % 10n === BigInt(match[3]!);
}
