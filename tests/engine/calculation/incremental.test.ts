import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { createEngine, evaluateCalculation, type CellResult } from '#engine';
import { EditedSheet, edits, type Edit } from './random-edits';

/** Plays edits on an engine that keeps state; after each the result must be that from scratch. */
function play(all: readonly Edit[]): ReadonlyMap<string, CellResult> {
  const engine = createEngine();
  const edited = new EditedSheet();
  const seen = new Map<string, CellResult>();
  for (const one of all) {
    const delta = engine.update(edited.apply(one));
    for (const id of delta.removed) seen.delete(id);
    for (const result of delta.cells) seen.set(result.id, result);
    const scratch = evaluateCalculation({ settings: edited.settings, cells: edited.all() });
    expect(engine.result()).toEqual(scratch);
    // What a client has put together from the deltas is the same again.
    expect(Object.fromEntries(seen)).toEqual(scratch.cells);
    expect(delta.names).toEqual(scratch.names);
  }
  return seen;
}

describe('a calculation that is edited', () => {
  it('comes to the same as one that is computed from scratch, whatever the edits', () => {
    const met = new Map<string, number>();
    const count = (what: string) => met.set(what, (met.get(what) ?? 0) + 1);
    fc.assert(
      fc.property(edits, (all) => {
        for (const { lines, diagnostics, outsideRange } of play(all).values()) {
          for (const line of lines) if (line.value !== undefined) count('value');
          for (const { code } of diagnostics) count(code);
          if (outsideRange.length > 0) count('outside');
        }
      }),
      { numRuns: 300 },
    );
    // Else the property would hold for want of anything computed.
    for (const what of ['value', 'CIRCLE', 'DEFINED_TWICE', 'UNKNOWN_NAME', 'UNITS_DISAGREE', 'outside'])
      expect(met.get(what) ?? 0, what).toBeGreaterThan(3);
    expect(met.get('FAULT')).toBeUndefined();
  });
});
