import MarkdownIt from 'markdown-it';
import type { StateInline, Token } from 'markdown-it/index.js';

/** What a text cell says, as a tree that a component lays out; no HTML is ever made from it. */
export type MarkdownNode =
  | { type: 'text'; text: string }
  | { type: 'math'; latex: string; display: boolean }
  | { type: 'value'; name: string }
  | { type: 'element'; tag: string; attributes: Record<string, string>; children: MarkdownNode[] };

const allowedLink = /^(?:https?:\/\/|mailto:)/i;
/** Section heads are h2; heads within a text stand below them. */
const headings: Readonly<Record<string, string>> = { h1: 'h3', h2: 'h4', h3: 'h5', h4: 'h6', h5: 'h6', h6: 'h6' };

function mathRule(state: StateInline, silent: boolean): boolean {
  const { src, pos } = state;
  if (src[pos] !== '$') return false;
  const mark = src[pos + 1] === '$' ? '$$' : '$';
  const from = pos + mark.length;
  const end = src.indexOf(mark, from);
  if (end <= from || /\s/.test(src[from] ?? ' ') || /\s/.test(src[end - 1] ?? ' ')) return false;
  if (!silent) {
    const token = state.push('math', '', 0);
    token.content = src.slice(from, end);
    token.markup = mark;
  }
  state.pos = end + mark.length;
  return true;
}

const valuePattern = /^\{\{\s*([^\s{}]{1,80})\s*\}\}/;

function valueRule(state: StateInline, silent: boolean): boolean {
  if (state.src[state.pos] !== '{') return false;
  const found = valuePattern.exec(state.src.slice(state.pos, state.pos + 100));
  if (found === null) return false;
  if (!silent) state.push('value', '', 0).content = found[1] ?? '';
  state.pos += found[0].length;
  return true;
}

function createReader(): MarkdownIt {
  const reader = new MarkdownIt({ html: false, linkify: false, breaks: false });
  reader.disable(['image', 'html_block', 'html_inline']);
  reader.validateLink = (address) => allowedLink.test(address.trim());
  reader.inline.ruler.before('escape', 'math', mathRule);
  reader.inline.ruler.before('emphasis', 'value', valueRule);
  return reader;
}

const reader = createReader();

function attributesOf(token: Token): Record<string, string> {
  if (token.tag === 'a') return { href: token.attrGet('href') ?? '', rel: 'noopener noreferrer', target: '_blank' };
  const start = token.tag === 'ol' ? token.attrGet('start') : null;
  if (start !== null) return { start };
  const align = /text-align:(left|center|right)/.exec(token.attrGet('style') ?? '')?.[1];
  return align === undefined ? {} : { class: `text-${align}` };
}

function element(tag: string, children: MarkdownNode[], attributes: Record<string, string> = {}): MarkdownNode {
  return { type: 'element', tag: headings[tag] ?? tag, attributes, children };
}

function leaf(token: Token): MarkdownNode[] {
  switch (token.type) {
    case 'inline':
      return treeOf(token.children ?? []);
    case 'math':
      return [{ type: 'math', latex: token.content, display: token.markup === '$$' }];
    case 'value':
      return [{ type: 'value', name: token.content }];
    case 'softbreak':
      return [{ type: 'text', text: ' ' }];
    case 'hardbreak':
      return [element('br', [])];
    case 'hr':
      return [element('hr', [])];
    case 'code_inline':
      return [element('code', [{ type: 'text', text: token.content }])];
    case 'fence':
    case 'code_block':
      return [element('pre', [element('code', [{ type: 'text', text: token.content.replace(/\n$/, '') }])])];
    default:
      return token.content === '' ? [] : [{ type: 'text', text: token.content }];
  }
}

/** Markdown-it gives a flat run of opening and closing tokens; this folds them. */
function treeOf(tokens: readonly Token[]): MarkdownNode[] {
  const root: MarkdownNode[] = [];
  const open: { children: MarkdownNode[] }[] = [{ children: root }];
  for (const token of tokens) {
    const parent = open.at(-1)?.children ?? root;
    if (token.nesting === 1) {
      const children: MarkdownNode[] = [];
      // Paragraphs of tight lists are marked hidden: their content stands in the item itself.
      if (!token.hidden) parent.push(element(token.tag, children, attributesOf(token)));
      open.push({ children: token.hidden ? parent : children });
    } else if (token.nesting === -1) {
      open.pop();
    } else {
      parent.push(...leaf(token));
    }
  }
  return root;
}

/** Reads Markdown with inline mathematics (`$…$`) and live values (`{{name}}`); HTML stays text. */
export function readMarkdown(source: string): MarkdownNode[] {
  return treeOf(reader.parse(source, {}));
}
