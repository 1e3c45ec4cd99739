import { partFigures } from '../../units/figures';

/** Figures as written, in threes, with a power of ten for `1e6`. */
export function figuresLatex(text: string): string {
  const [mantissa = '', power] = text.split(/[eE]/);
  const figures = partFigures(mantissa.replace(/^(-?)\./, '$10.').replace(/\.$/, ''), '\\,');
  if (power === undefined) return figures;
  const exponent = String(Number(power));
  return Number(mantissa) === 1 ? `10^{${exponent}}` : `${figures}\\times 10^{${exponent}}`;
}
