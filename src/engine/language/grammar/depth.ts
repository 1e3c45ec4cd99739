import { ContextTracker } from '@lezer/lr';
import { close, newline, open } from './parser.terms';

/** How many parentheses stand open in the line: the end of a line means something else inside them. */
export const depthTracker = new ContextTracker<number>({
  start: 0,
  shift(depth, term) {
    if (term === open) return depth + 1;
    if (term === close) return Math.max(0, depth - 1);
    return term === newline ? 0 : depth;
  },
  hash: (depth) => depth,
});
