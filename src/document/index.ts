// The door of the shared document: named exports only.
export { localOrigin, openDocument, type CalculationDocument, type NewCell } from './calculation-document';
export { canonicalJson } from './canonical';
export { cellShapes } from './cells/index';
export {
  exchangeFormat,
  exchangeSchema,
  exchangeVersion,
  fillDocument,
  toExchange,
  type ExchangeCalculation,
  type ExchangeHead,
} from './exchange';
export { measureDocument, type DocumentMeasure } from './measure';
export type { DocumentCell } from './read-cell';
export { cellKinds, documentLimits, type CellShape } from './shape';
