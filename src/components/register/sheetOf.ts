import type { RouteLocationRaw } from 'vue-router';
import type { RegisterRow } from '#contract';

/** The sheet of a line of the register: of the revision that stands there. */
export const sheetOf = ({ calculationId, letter }: RegisterRow): RouteLocationRaw => ({
  name: 'sheet',
  params: { calculationId, letter },
});
