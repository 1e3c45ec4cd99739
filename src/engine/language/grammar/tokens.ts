import { ExternalTokenizer, type InputStream } from '@lezer/lr';
import { scanUnit } from '../../units/resolve';
import { goesOn } from '../lines';
import { continuation, Coverage, newline, PlusMinus, Unit } from './parser.terms';

const endOfLine = 10;
const openingParenthesis = 40;
const plus = 43;
const plusMinus = 177;
/** Longer unit expressions than this are not written by hand. */
const unitReach = 120;
/** How far is looked for the closing parenthesis of a line that goes on. */
const lineReach = 4000;

/** The text that lies ahead, to the end of the line or over it. */
function ahead(input: InputStream, reach: number, overLines = false): string {
  let text = '';
  for (let offset = 0; offset < reach; offset += 1) {
    const code = input.peek(offset);
    if (code < 0 || (code === endOfLine && !overLines)) break;
    text += String.fromCharCode(code);
  }
  return text;
}

/** Units, ± and (k=2) mean what they do only behind a number (a unit also after `to`): elsewhere the grammar cannot shift them. */
export const unitTokens = new ExternalTokenizer((input, stack) => {
  if (input.next === openingParenthesis && stack.canShift(Coverage)) {
    const coverage = /^\(\s*k\s*=\s*\d+(\.\d+)?\s*\)/.exec(ahead(input, 24));
    if (coverage !== null) input.acceptToken(Coverage, coverage[0].length);
    return;
  }
  // `+-` is an uncertainty behind a number only: `a +-b` adds minus b.
  if ((input.next === plus || input.next === plusMinus) && stack.canShift(PlusMinus)) {
    const sign = /^(?:±|\+\/?[-−])/.exec(ahead(input, 3));
    if (sign !== null) input.acceptToken(PlusMinus, sign[0].length);
    return;
  }
  if (!stack.canShift(Unit)) return;
  const scanned = scanUnit(ahead(input, unitReach));
  if (scanned !== undefined) input.acceptToken(Unit, scanned.end);
});

/** The end of a line ends what is written on it, except inside parentheses that close further down. */
export const newlines = new ExternalTokenizer(
  (input, stack) => {
    if (input.next !== endOfLine) return;
    input.advance();
    const depth = Number(stack.context);
    const runsOn = depth > 0 && goesOn(ahead(input, lineReach, true), depth);
    input.acceptToken(runsOn ? continuation : newline);
  },
  { contextual: true },
);
