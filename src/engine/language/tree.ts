import type { Diagnostic, Span } from '../errors/diagnostic';
import type { ResolvedUnit } from '../units/types';

export interface UnitNode {
  span: Span;
  unit: ResolvedUnit;
}

interface Node {
  span: Span;
}
export interface NumberNode extends Node {
  type: 'number';
  value: number;
  /** Figures as written, for printing: `38.5`, `1.5e-3`; `-5` where the sign belongs to a level (`-5 degC`). */
  text: string;
  unit?: UnitNode | undefined;
  /** Standard uncertainty (k = 1), in the unit of the literal or as a fraction of the value. */
  uncertainty?:
    | {
        value: number;
        relative: boolean;
        /** As written behind the sign ±, for printing: `0.1 mm`, `10 % (k=2)`. */
        text?: string | undefined;
      }
    | undefined;
}
export interface NameNode extends Node {
  type: 'name';
  /** Canonical: Greek spelled out (`rho`), subscripts with underscore. */
  name: string;
}
/** `w.rho`, `tube.Nu`. */
export interface MemberNode extends Node {
  type: 'member';
  object: string;
  property: string;
}
export interface UnaryNode extends Node {
  type: 'unary';
  operator: '-' | '+' | 'not';
  operand: Expression;
}
export interface BinaryNode extends Node {
  type: 'binary';
  operator: '+' | '-' | '*' | '/' | '^';
  left: Expression;
  right: Expression;
}
/** `0.5 <= Pr <= 2000`: operands one more than operators. */
export interface ComparisonNode extends Node {
  type: 'comparison';
  operands: Expression[];
  operators: ('<' | '<=' | '>' | '>=' | '==' | '!=')[];
}
export interface LogicalNode extends Node {
  type: 'logical';
  operator: 'and' | 'or';
  left: Expression;
  right: Expression;
}
/** Functions, `if(condition, a, b)` among them. */
export interface CallNode extends Node {
  type: 'call';
  name: string;
  nameSpan: Span;
  arguments: Expression[];
}
/** Parentheses as written, kept so that parse–print–parse is the identity. */
export interface GroupNode extends Node {
  type: 'group';
  inner: Expression;
}
/** What could not be read; a diagnostic of the line says why. */
export interface MissingNode extends Node {
  type: 'missing';
}
export type Expression =
  | NumberNode
  | NameNode
  | MemberNode
  | UnaryNode
  | BinaryNode
  | ComparisonNode
  | LogicalNode
  | CallNode
  | GroupNode
  | MissingNode;

export interface Line {
  kind: 'assignment' | 'expression' | 'require' | 'note' | 'blank';
  /** Zero-based number of its first line in the source. */
  number: number;
  span: Span;
  name?: string | undefined;
  nameSpan?: Span | undefined;
  expression?: Expression | undefined;
  /** Unit asked for with `to`. */
  target?: UnitNode | undefined;
  note?: string | undefined;
  /** Of reading only: syntax, unknown units, hints. */
  diagnostics: Diagnostic[];
}
