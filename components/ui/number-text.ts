/** Numbers as controls and readouts write them: a real minus sign, as many decimals as the step of the control has, never an exponent. */

const minus = '\u2212';

export const withMinus = (text: string): string => text.replace(/^-/, minus);

/** A typed number, with a hyphen, a real minus sign or a decimal comma; null where it is none. */
export function parseNumber(text: string): number | null {
  const plain = text.trim().replace(minus, '-').replace(',', '.');
  if (!/^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i.test(plain)) return null;
  return Number(plain);
}

export function fixed(value: number, decimals: number): string {
  const text = value.toFixed(decimals);
  return Number(text) === 0 ? text.replace('-', '') : withMinus(text);
}

/** Decimals that show every value of a control with this step: 0.05 has two, 5 has none. */
export function decimalsOf(step: number): number {
  for (let decimals = 0; decimals < 6; decimals++) {
    const scaled = step * 10 ** decimals;
    if (Math.abs(scaled - Math.round(scaled)) < 1e-9 * Math.max(1, scaled)) return decimals;
  }
  return 6;
}

/** A measured value in about `digits` significant digits: 0.351, 38.6, 1204. */
export function significant(value: number, digits = 3): string {
  if (value === 0) return '0';
  const whole = Math.floor(Math.log10(Math.abs(value))) + 1;
  return fixed(value, Math.min(6, Math.max(0, digits - whole)));
}
