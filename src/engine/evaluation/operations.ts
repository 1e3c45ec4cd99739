/**
 * Instructions of a plan. Registers hold inputs, then constants, then what instructions compute.
 * `when`, `otherwise` and `end` enclose the two sides of a condition and nest.
 */
export const Op = {
  /** out = a */
  move: 0,
  add: 1,
  subtract: 2,
  multiply: 3,
  divide: 4,
  negate: 5,
  reciprocal: 6,
  /** a to the whole power b; b is the exponent itself. */
  wholePower: 7,
  power: 8,
  least: 9,
  greatest: 10,
  less: 11,
  lessOrEqual: 12,
  greater: 13,
  greaterOrEqual: 14,
  equal: 15,
  different: 16,
  not: 17,
  /** Where a is 0, goes on behind the instruction b, which is `otherwise` or `end`. */
  when: 18,
  /** End of the first side: goes on at the instruction b, which is `end`. */
  otherwise: 19,
  end: 20,
  /** Function of one argument; b is its number. */
  call: 21,
  /** Functions of two arguments have the codes from here on. */
  callOfTwo: 64,
} as const;
