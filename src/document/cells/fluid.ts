import type { CellShape } from '../shape';

/** A fluid state; its source gives the inputs. */
export const fluidShape: CellShape = {
  kind: 'fluid',
  settings: ['name', 'substance', 'mode', 'tbv'],
  template: 'T = \np = ',
};
