import { ExternalTokenizer, type InputStream } from '@lezer/lr';
import { scanUnit } from '../../units/resolve';
import { continuation, Coverage, newline, Unit } from './parser.terms';

const endOfLine = 10;
/** Longer unit expressions than this are not written by hand. */
const unitReach = 120;

function ahead(input: InputStream, reach: number): string {
  let text = '';
  for (let offset = 0; offset < reach; offset += 1) {
    const code = input.peek(offset);
    if (code < 0 || code === endOfLine) break;
    text += String.fromCharCode(code);
  }
  return text;
}

/** A unit stands only directly after a number or after `to`: elsewhere the grammar cannot shift it. */
export const unitTokens = new ExternalTokenizer((input, stack) => {
  if (stack.canShift(Coverage) && input.next === 40) {
    const coverage = /^\(\s*k\s*=\s*\d+(\.\d+)?\s*\)/.exec(ahead(input, 24));
    if (coverage !== null) {
      input.acceptToken(Coverage, coverage[0].length);
      return;
    }
  }
  if (!stack.canShift(Unit)) return;
  const text = ahead(input, unitReach);
  // `to` begins a target, never a unit.
  if (/^(to|and|or|not)\b/.test(text)) return;
  const scanned = scanUnit(text);
  if (scanned !== undefined) input.acceptToken(Unit, scanned.end);
});

/** What can only be the begin of a line of its own, even inside a parenthesis left open. */
const freshLine = /^[ \t]*(?:#|require\b|[A-Za-z_\u0370-\u03ff][\w\u0370-\u03ff']*[ \t]*=(?!=)|$)/;

/** A line may go on inside parentheses; one left open must not swallow the lines below it. */
export const newlines = new ExternalTokenizer(
  (input, stack) => {
    if (input.next !== endOfLine) return;
    input.advance();
    const ends = stack.canShift(newline) || freshLine.test(ahead(input, 200));
    input.acceptToken(ends ? newline : continuation);
  },
  { contextual: true },
);
