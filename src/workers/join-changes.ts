import type { CalculationChange, CellInput } from '#engine';

/** Two changes, one after the other, as one: what is put later stands, what is removed later is gone. */
export function joinChanges(first: CalculationChange, second: CalculationChange): CalculationChange {
  const put = new Map<string, CellInput>((first.put ?? []).map((cell) => [cell.id, cell]));
  const remove = new Set(first.remove ?? []);
  for (const id of second.remove ?? []) {
    put.delete(id);
    remove.add(id);
  }
  for (const cell of second.put ?? []) {
    put.set(cell.id, cell);
    remove.delete(cell.id);
  }
  const settings = second.settings ?? first.settings;
  const order = second.order ?? first.order;
  return {
    ...(settings === undefined ? {} : { settings }),
    put: [...put.values()],
    remove: [...remove],
    ...(order === undefined ? {} : { order }),
  };
}
