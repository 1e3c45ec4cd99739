const minus = (text: string) => text.replace('-', '−');

function powerOfTen(value: number): string {
  const [mantissa = '', power = ''] = value.toExponential(3).split('e');
  const raised = [...String(Number(power))].map((sign) => '⁻⁰¹²³⁴⁵⁶⁷⁸⁹'['-0123456789'.indexOf(sign)]).join('');
  const short = String(Number(mantissa));
  if (short === '1') return `10${raised}`;
  return `${minus(short)}·10${raised}`;
}

/** A figure to four digits as it stands in a sentence: `10 000`, `5·10⁶`, `0.7`. */
export function figureText(value: number): string {
  const size = Math.abs(value);
  if (size !== 0 && (size >= 1e6 || size < 1e-3)) return powerOfTen(value);
  const [whole = '', decimals] = minus(String(Number(value.toPrecision(4)))).split('.');
  const parted = whole.replace(/\B(?=(\d{3})+(?!\d))/g, '\u00a0');
  return decimals === undefined ? parted : `${parted}.${decimals}`;
}

/** The same with the unit of the symbol that it belongs to. */
export function quantityText(value: number, unit: string): string {
  return unit === '1' ? figureText(value) : `${figureText(value)} ${unit}`;
}

/** `L is not given`, `L and D are not given`. */
export function notGiven(symbols: readonly string[]): string {
  const last = symbols.at(-1) ?? '';
  if (symbols.length === 1) return `${last} is not given`;
  return `${symbols.slice(0, -1).join(', ')} and ${last} are not given`;
}
