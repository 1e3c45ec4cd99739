import type { SyntaxNode } from '@lezer/common';
import type { Diagnostic, Span } from '../../errors/diagnostic';

/** One line while it is read: its text, where it begins in the cell, and what is found wrong. */
export class Reading {
  readonly diagnostics: Diagnostic[] = [];

  constructor(
    readonly source: string,
    /** Offset of the line in the source of the cell. */
    readonly offset: number,
  ) {}

  text(node: SyntaxNode): string {
    return this.source.slice(node.from, node.to);
  }

  /** Span of a node in the source of the cell. */
  span(node: { from: number; to: number }): Span {
    return { from: node.from + this.offset, to: node.to + this.offset };
  }

  report(diagnostic: Diagnostic): void {
    this.diagnostics.push(diagnostic);
  }
}
