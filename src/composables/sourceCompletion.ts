import {
  autocompletion,
  type Completion,
  type CompletionContext,
  type CompletionResult,
} from '@codemirror/autocomplete';
import { listFunctions, listUnits, type NamedValue } from '#engine';

/** What can be offered while a line is written. */
export interface Offers {
  names: readonly NamedValue[];
  /** Symbols that the relation or the fluid state of this cell takes on the left. */
  symbols: readonly { symbol: string; quantity: string; unit: string }[];
  /** Number of the cell that defines a name. */
  numberOf(cellId: string): string;
}

function valueWords(named: NamedValue): string {
  if (named.value === undefined) return 'no value';
  return `= ${named.value.text}${named.value.unit === '' ? '' : ` ${named.value.unit}`}`;
}

function nameOptions({ names, numberOf }: Offers): Completion[] {
  return names.map((named) => ({
    label: named.name,
    detail: `${valueWords(named)}  ${numberOf(named.cellId)}`,
    type: 'variable',
    boost: named.name.includes('.') ? 0 : 1,
  }));
}

const functionOptions: Completion[] = listFunctions.map((signature) => ({
  label: signature.name,
  apply: `${signature.name}(`,
  detail: `(${signature.parameters.join(', ')})`,
  info: signature.help,
  type: 'function',
  boost: -1,
}));

const unitOptions: Completion[] = listUnits().map((unit) => ({ label: unit, type: 'unit' }));

function symbolOptions(offers: Offers): Completion[] {
  return offers.symbols.map((symbol) => ({
    label: symbol.symbol,
    apply: `${symbol.symbol} = `,
    detail: `${symbol.quantity}${symbol.unit === '1' ? '' : `, ${symbol.unit}`}`,
    type: 'symbol',
    boost: 2,
  }));
}

/** A unit stands directly after a number, or after `to`; everywhere else a word is a name. */
const afterNumber =
  /(?:(?:^|[^\p{L}\p{N}_.])\d+(?:\.\d*)?(?:[eE][+-]?\d+)?[ \t]*|\bto[ \t]+)([\p{L}°µ%][\p{L}\p{N}_^/*·² ³()°µ]*)?$/u;

function offer(context: CompletionContext, offers: Offers): CompletionResult | null {
  const line = context.state.doc.lineAt(context.pos);
  const before = line.text.slice(0, context.pos - line.from);
  if (before.includes('#')) return null;
  const unit = afterNumber.exec(before);
  const word = /[\p{L}_][\p{L}\p{N}_.']*$/u.exec(before);
  if (unit !== null && (unit[1] !== undefined || context.explicit)) {
    const last = /[\p{L}°µ%_]*$/u.exec(before)?.[0] ?? '';
    return { from: context.pos - last.length, options: unitOptions, validFor: /^[\p{L}°µ%_]*$/u };
  }
  if (word === null && !context.explicit) return null;
  const from = context.pos - (word?.[0].length ?? 0);
  const beginsLine = line.text.slice(0, from - line.from).trim() === '';
  const options = [
    ...(beginsLine ? symbolOptions(offers) : []),
    ...nameOptions(offers),
    ...(beginsLine && offers.symbols.length > 0 ? [] : functionOptions),
  ];
  return { from, options, validFor: /^[\p{L}_][\p{L}\p{N}_.']*$/u };
}

/** Names with value and cell, functions, units and a relation's symbols, as they are at the moment of asking. */
export function completion(offers: () => Offers) {
  return autocompletion({
    override: [(context) => offer(context, offers())],
    icons: false,
    // Enter ends the line; Tab takes what is offered.
    defaultKeymap: false,
    closeOnBlur: true,
    activateOnTyping: true,
    maxRenderedOptions: 60,
  });
}
