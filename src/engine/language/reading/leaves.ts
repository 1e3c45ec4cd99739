import type { SyntaxNode, Tree } from '@lezer/common';
import type { Span } from '../../errors/diagnostic';

/** A token of a line, or a stretch that is none (`⚠`). */
export interface Leaf {
  name: string;
  text: string;
  span: Span;
}

/** Tokens of a line in reading order. */
export function leavesOf(tree: Tree, source: string): Leaf[] {
  const leaves: Leaf[] = [];
  tree.iterate({
    enter(node) {
      if (node.from === node.to || node.node.firstChild !== null) return;
      leaves.push({ name: node.name, text: source.slice(node.from, node.to), span: { from: node.from, to: node.to } });
    },
  });
  return leaves;
}

export function childrenOf(node: SyntaxNode): SyntaxNode[] {
  const list: SyntaxNode[] = [];
  for (let child = node.firstChild; child !== null; child = child.nextSibling) list.push(child);
  return list;
}

/** The place of the first error of a tree, deepest errors included. */
export function firstError(tree: Tree): Span | undefined {
  let found: Span | undefined;
  tree.iterate({
    enter(node) {
      if (found === undefined && node.type.isError) found = { from: node.from, to: node.to };
      return found === undefined;
    },
  });
  return found;
}
