import type { CellShape } from '../shape';

/** Prose in Markdown with live values (`{{Q}}`). */
export const textShape: CellShape = { kind: 'text', settings: ['tbv'], template: '' };
