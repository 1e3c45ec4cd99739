import * as Y from 'yjs';
import { cellsMap, documentLimits } from './shape';

export interface DocumentMeasure {
  cells: number;
  /** Signs of the longest source. */
  longestSource: number;
  /** By how much the limits are exceeded, cells and signs together; 0 within them. */
  excess: number;
}

/** How large a calculation is against its limits; costs no more than a walk over the cells. */
export function measureDocument(doc: Y.Doc): DocumentMeasure {
  const map = doc.getMap(cellsMap);
  const measure: DocumentMeasure = {
    cells: map.size,
    longestSource: 0,
    excess: Math.max(0, map.size - documentLimits.cells),
  };
  for (const value of map.values()) {
    const source = value instanceof Y.Map ? value.get('source') : undefined;
    if (!(source instanceof Y.Text)) continue;
    measure.longestSource = Math.max(measure.longestSource, source.length);
    measure.excess += Math.max(0, source.length - documentLimits.sourceLength);
  }
  return measure;
}
