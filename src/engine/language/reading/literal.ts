import type { SyntaxNode } from '@lezer/common';
import { languageDiagnostic } from '../../errors/language-errors';
import { isDimensionless, sameDimension } from '../../units/dimension';
import { plainUnit, scanUnit } from '../../units/resolve';
import type { ResolvedUnit } from '../../units/types';
import type { MissingNode, NumberNode, UnitNode } from '../tree';
import type { Reading } from './reading';

const raisedSigns = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/** `⁻¹²` as `-12`. */
export function loweredFigures(raised: string): string {
  return [...raised].map((sign) => (sign === '⁻' ? '-' : String(raisedSigns.indexOf(sign)))).join('');
}

/** Figures in the plain form of the language: no gaps between thousands, `e` for the power of ten. */
export function plainFigures(written: string): string {
  const [mantissa = '', power] = written.replace(/[\u00a0\u202f\u2009]/g, '').split('×10');
  return (power === undefined ? mantissa : `${mantissa}e${loweredFigures(power)}`).replace('−', '-');
}

export function readUnit(reading: Reading, node: SyntaxNode | null | undefined): UnitNode | undefined {
  if (node === null || node === undefined) return undefined;
  return { span: reading.span(node), unit: scanUnit(reading.text(node))?.unit ?? plainUnit };
}

function coverageFactor(reading: Reading, node: SyntaxNode | null): number {
  const factor = node === null ? 1 : Number(/[\d.]+/.exec(reading.text(node))?.[0] ?? 1);
  return factor > 0 ? factor : 1;
}

/** How an uncertainty in its own unit becomes one in the unit of the value. */
function uncertaintyScale(unit: ResolvedUnit, amount: ResolvedUnit | undefined): { scale: number; relative: boolean } {
  if (amount === undefined) return { scale: 1, relative: false };
  const percent = amount.display === '%' || amount.display === '‰';
  if (percent && unit.display !== amount.display) return { scale: amount.factor, relative: true };
  return { scale: amount.factor / unit.factor, relative: false };
}

function readUncertainty(reading: Reading, node: SyntaxNode, unit: UnitNode | undefined): NumberNode['uncertainty'] {
  const amount = node.getChild('Number');
  if (amount === null) return undefined;
  const amountUnit = readUnit(reading, node.getChild('Unit'));
  const { scale, relative } = uncertaintyScale(unit?.unit ?? plainUnit, amountUnit?.unit);
  const [own, value] = [amountUnit?.unit, unit?.unit ?? plainUnit];
  if (own !== undefined && !relative && !sameDimension(own.dimension, value.dimension)) {
    const parameters = { uncertainty: own.display, unit: isDimensionless(value.dimension) ? '1' : value.display };
    reading.report(languageDiagnostic('UNCERTAINTY_UNIT', reading.span(node), parameters));
  }
  if (own?.display === '%' && value.display === '%') {
    reading.report(languageDiagnostic('PERCENT_OF_PERCENT', reading.span(node)));
  }
  const figures = plainFigures(reading.text(amount));
  const coverage = node.getChild('Coverage');
  const written = [figures, amountUnit?.unit.text, coverage === null ? undefined : reading.text(coverage)];
  return {
    value: (Number(figures) * scale) / coverageFactor(reading, coverage),
    relative,
    text: written.filter((part) => part !== undefined).join(' '),
  };
}

/** A number with its unit and uncertainty; missing when the number cannot be computed with. */
export function readLiteral(reading: Reading, node: SyntaxNode): NumberNode | MissingNode {
  const number = node.getChild('Number') ?? node;
  const text = plainFigures(reading.text(number));
  const value = Number(text);
  const span = reading.span(node);
  if (!Number.isFinite(value) || (value === 0 && /[1-9]/.test(text.split(/e/i)[0] ?? ''))) {
    reading.report(languageDiagnostic('NUMBER_RANGE', reading.span(number), { text }));
    return { type: 'missing', span };
  }
  const unit = readUnit(reading, node.getChild('Unit'));
  const given = node.getChild('Uncertainty');
  const uncertainty = given === null ? undefined : readUncertainty(reading, given, unit);
  return { type: 'number', span, value, text, unit, uncertainty };
}
