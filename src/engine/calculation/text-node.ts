import type { Diagnostic } from '../errors/diagnostic';
import { evaluationDiagnostic } from '../errors/evaluation-errors';
import { canonicalName } from '../language/index';
import { nearest } from '../language/inference';
import { baseOf, outsideBehindAll, type CalculationNode, type Outcome, type Surroundings } from './node';
import type { CellInput } from './types';

const inlineName = /\{\{\s*([^{}]+?)\s*\}\}/g;

interface InlineUse {
  key: string;
  span: { from: number; to: number };
}

function inlineUses(source: string): InlineUse[] {
  return [...source.matchAll(inlineName)].map((match) => {
    const written = match[1] ?? '';
    const from = match.index + match[0].indexOf(written);
    return { key: written.split('.').map(canonicalName).join('.'), span: { from, to: from + written.length } };
  });
}

/** Names whose values stand in a text: `{{Q}}`, `{{w.rho}}`. */
export function inlineNames(source: string): string[] {
  return [...new Set(inlineUses(source).map(({ key }) => key))];
}

function problemOf({ key, span }: InlineUse, surroundings: Surroundings): Diagnostic | undefined {
  const symbol = surroundings.symbol(key);
  if (symbol !== undefined && symbol.several === undefined) return undefined;
  if (surroundings.symbol(baseOf(key))?.several === 'unknown') return undefined;
  const candidates = key.includes('.') ? surroundings.keysOf(baseOf(key)) : surroundings.names();
  const near = nearest(key, candidates);
  const hint = near === undefined ? '' : ` Nearest: ${near}.`;
  const mend = near === undefined ? undefined : { label: `Take ${near}`, span, insert: near };
  return evaluationDiagnostic('UNKNOWN_INLINE', span, { name: key, hint }, mend);
}

/** A text as a unit of dependence: it changes with the values it shows. */
export function textNode(cell: CellInput): CalculationNode {
  const inline = inlineUses(cell.source);
  const keys = [...new Set(inline.map(({ key }) => key))];
  const uses = [...new Set(keys.map(baseOf))];
  const compute = (surroundings: Surroundings): Outcome => ({
    symbols: new Map(),
    diagnostics: inline.flatMap((use) => problemOf(use, surroundings) ?? []),
    outsideRange: outsideBehindAll(uses, surroundings),
  });
  return { cellId: cell.id, index: 0, defines: undefined, uses, keys, compute };
}
