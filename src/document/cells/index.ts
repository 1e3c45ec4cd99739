import type { CellKind } from '#engine';
import type { CellShape } from '../shape';
import { expressionsShape } from './expressions';
import { fluidShape } from './fluid';
import { relationShape } from './relation';
import { sectionShape } from './section';
import { textShape } from './text';

export const cellShapes: Readonly<Record<CellKind, CellShape>> = {
  section: sectionShape,
  text: textShape,
  expressions: expressionsShape,
  fluid: fluidShape,
  relation: relationShape,
};
