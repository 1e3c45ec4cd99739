const thousands = /\B(?=(\d{3})+(?!\d))/g;

/** Parts figures in threes from the decimal sign on both sides (ISO 80000-1, 7.3.1). */
export function partFigures(figures: string, gap: string): string {
  const [whole = '', decimals] = figures.split('.');
  const parted = whole.replace(thousands, gap);
  if (decimals === undefined) return parted;
  const long = decimals.length > 4 || (whole.replace('-', '').length > 4 && decimals.length > 3);
  return `${parted}.${long ? decimals.replace(/(\d{3})(?=\d)/g, `$1${gap}`) : decimals}`;
}

/** Figures as written, in threes, with a power of ten for `1e6`. */
export function figuresLatex(text: string): string {
  const [mantissa = '', power] = text.split(/[eE]/);
  const figures = partFigures(mantissa.replace(/^(-?)\./, '$10.').replace(/\.$/, ''), '\\,');
  if (power === undefined) return figures;
  const exponent = String(Number(power));
  return Number(mantissa) === 1 ? `10^{${exponent}}` : `${figures}\\times 10^{${exponent}}`;
}
