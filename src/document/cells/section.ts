import type { CellShape } from '../shape';

/** A heading; its source is the title. */
export const sectionShape: CellShape = { kind: 'section', settings: [], template: '' };
