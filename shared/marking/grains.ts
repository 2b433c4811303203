/** Marks are integer grains: halves to sixths, eighths, tenths, twelfths and hundredths of a mark are whole numbers. */
export const GRAINS_PER_MARK = 1200;

const greatestCommonDivisor = (a: number, b: number): number => (b === 0 ? a : greatestCommonDivisor(b, a % b));

/** Marks as a person reads them: marksText(2400) is "2", marksText(600) is "0.5", marksText(400) is "1/3". */
export function marksText(grains: number): string {
  if (grains < 0) return `-${marksText(-grains)}`;
  const whole = Math.floor(grains / GRAINS_PER_MARK);
  const rest = grains % GRAINS_PER_MARK;
  if (rest === 0) return String(whole);
  const hundredths = GRAINS_PER_MARK / 100;
  if (rest % hundredths === 0) {
    const decimals = String(rest / hundredths).padStart(2, '0').replace(/0$/, '');
    return `${whole}.${decimals}`;
  }
  const common = greatestCommonDivisor(rest, GRAINS_PER_MARK);
  const fraction = `${rest / common}/${GRAINS_PER_MARK / common}`;
  return whole === 0 ? fraction : `${whole} ${fraction}`;
}
