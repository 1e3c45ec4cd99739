import type { Expression } from '../language/tree';

/**
 * A flat plan: instructions over numbered float64 registers. It knows no units and no names; the
 * same plan serves one point and, column by column, many.
 */
export interface Plan {
  op: Uint8Array;
  /** Operands: registers, or what `Op` says of the instruction. */
  a: Int32Array;
  b: Int32Array;
  out: Int32Array;
  /** What the inputs are, as `name` or `object.property`; they take the first registers, in this order. */
  inputs: readonly string[];
  /** They take the registers behind the inputs. */
  constants: Float64Array;
  registers: number;
  result: number;
  /** The part of the expression that each instruction computes. */
  nodes: readonly Expression[];
  /** A literal that no float64 can hold; such a plan has no value. */
  broken?: Expression;
}
