import type { CellShape } from '../shape';

/** A relation of the catalogue; its source binds the symbols and may go on with lines of its own. */
export const relationShape: CellShape = {
  kind: 'relation',
  settings: ['name', 'relation', 'keepReason', 'tbv'],
  template: '',
};
