import type { CellShape } from '../shape';

/** Lines of the expression language. */
export const expressionsShape: CellShape = { kind: 'expressions', settings: ['tbv'], template: '' };
