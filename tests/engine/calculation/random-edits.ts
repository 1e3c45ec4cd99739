import fc from 'fast-check';
import { defaultSettings, type CalculationChange, type CalculationSettings, type CellInput } from '#engine';

const names = ['a', 'b', 'T_1', 'T_2', 'Re', 'w', 'r', 'L'];
const use = fc.constantFrom(...names, 'w.rho', 'w.mu', 'w.T', 'w.nothing', 'r.Nu', 'r.f', 'pi', 'unknown_1');
const literal = fc.constantFrom('2', '0.5', '3 m', '20 degC', '300 K', '5 K', '0', '3 barg', '20000', '1e-3 Pa s');
const term = fc.oneof({ weight: 3, arbitrary: use }, { weight: 2, arbitrary: literal });
const expression = fc.oneof(
  term,
  fc.tuple(term, fc.constantFrom('+', '-', '*', '/', '^'), term).map((parts) => parts.join(' ')),
  fc.tuple(term, term, term).map(([x, y, z]) => `if(${x} > ${y}, ${y}, ${z})`),
  fc.tuple(term, term).map(([x, y]) => `min(${x}, ${y})/2`),
  term.map((x) => `ln(${x})`),
);
const assignment = fc.tuple(fc.constantFrom(...names), expression).map(([name, right]) => `${name} = ${right}`);
const line = fc.oneof(
  { weight: 6, arbitrary: assignment },
  fc.tuple(term, term).map(([x, y]) => `require ${x} <= ${y}`),
  expression,
  fc.constantFrom('# a note', '', 'x = (', 'L = a*b to degC', 'T_1 = 25 degC # given'),
);
const source = fc.array(line, { minLength: 0, maxLength: 4 }).map((all) => all.join('\n'));

type Content = Omit<CellInput, 'id'>;
const fluid = fc
  .record({ T: term, p: fc.constantFrom('3 bar', 'a', '-1 bar'), name: fc.constantFrom('w', 'w', 'a') })
  .map(({ T, p, name }): Content => {
    return { kind: 'fluid', source: `T = ${T}\np = ${p}`, settings: { name, substance: 'water' } };
  });
const relation = fc.record({ Re: term, keep: fc.boolean(), below: line }).map(({ Re, keep, below }): Content => {
  const settings = { name: 'r', relation: 'gnielinski-1976-tube', ...(keep ? { keepReason: 'short' } : {}) };
  return { kind: 'relation', source: `Re = ${Re}\nPr = 5\n${below}`, settings };
});
const cell: fc.Arbitrary<Content> = fc.oneof(
  { weight: 6, arbitrary: source.map((text): Content => ({ kind: 'expressions', source: text, settings: {} })) },
  use.map((key): Content => ({ kind: 'text', source: `It is {{${key}}}.`, settings: {} })),
  fc.constant<Content>({ kind: 'section', source: 'Flow', settings: {} }),
  fluid,
  relation,
);

const ids = ['c0', 'c1', 'c2', 'c3', 'c4', 'c5'];
export type Edit =
  | { type: 'put'; id: string; cell: Content }
  | { type: 'remove'; id: string }
  | { type: 'order'; order: string[] }
  | { type: 'settings'; settings: CalculationSettings };

const put = fc.record({ type: fc.constant('put' as const), id: fc.constantFrom(...ids), cell });
const remove = fc.record({ type: fc.constant('remove' as const), id: fc.constantFrom(...ids) });
const order = fc.record({
  type: fc.constant('order' as const),
  order: fc.shuffledSubarray(ids, { minLength: ids.length }),
});
const settings = fc.record({
  type: fc.constant('settings' as const),
  settings: fc.record({
    unitSystem: fc.constantFrom('SI' as const, 'US' as const),
    significantDigits: fc.constantFrom(3, 6),
    ambientPressure: fc.constantFrom(101325, 95000),
  }),
});

/** Edits of a small sheet with few names, so that circles, second definitions and unknown names are frequent. */
export const edits: fc.Arbitrary<Edit[]> = fc.array(
  fc.oneof(
    { weight: 6, arbitrary: put },
    { weight: 1, arbitrary: remove },
    { weight: 2, arbitrary: order },
    { weight: 1, arbitrary: settings },
  ),
  { minLength: 3, maxLength: 12 },
);

/** A sheet that is edited: the same for the engine that keeps state and for the one from scratch. */
export class EditedSheet {
  private readonly cells = new Map<string, CellInput>();
  private order: string[] = [];
  settings = defaultSettings;

  apply(one: Edit): CalculationChange {
    switch (one.type) {
      case 'put': {
        const changed = { ...one.cell, id: one.id };
        const isNew = !this.cells.has(one.id);
        this.cells.set(one.id, changed);
        if (!isNew) return { put: [changed] };
        this.order.push(one.id);
        return { put: [changed], order: this.order };
      }
      case 'remove':
        this.cells.delete(one.id);
        this.order = this.order.filter((id) => id !== one.id);
        return { remove: [one.id] };
      case 'order':
        this.order = one.order.filter((id) => this.cells.has(id));
        return { order: this.order };
      case 'settings':
        this.settings = one.settings;
        return { settings: one.settings };
    }
  }

  all(): CellInput[] {
    return this.order.flatMap((id) => this.cells.get(id) ?? []);
  }
}
