import katex from 'katex';
import { describe, expect, it } from 'vitest';
import {
  expressionLatex,
  findRelation,
  listFamilies,
  listRelations,
  readRelation,
  resolveUnit,
  symbolLatex,
  worstGrade,
  type Relation,
} from '#engine';
import { symbolsOf } from '../../../src/engine/relations/range-reading';
import { checkRowsOf, judged } from '../../helpers/relations';

const entries = listRelations();
const table = entries.map(({ relation }) => [relation.id, relation] as const);

const declared = (relation: Relation) => [...relation.inputs, ...relation.validitySymbols];
/** Expressions of a relation in the order in which they are worked, with the symbol that each gives. */
function steps(relation: Relation) {
  return readRelation(relation).formula.map((line) =>
    line.kind === 'assignment'
      ? { gives: line.symbol, from: [line.expression], own: false }
      : { gives: line.symbol, from: [line.low, line.high, line.equation], own: true },
  );
}

describe('catalogue', () => {
  it('has every id once, and finds it with its family', () => {
    expect(new Set(entries.map(({ relation }) => relation.id)).size).toBe(entries.length);
    for (const { relation, family } of entries) expect(findRelation(relation.id)?.family).toBe(family);
  });

  it('has every title once', () => {
    const titles = entries.map(({ relation }) => relation.title);
    expect(titles.filter((title, index) => titles.indexOf(title) !== index)).toEqual([]);
  });

  it('has no empty family', () => {
    for (const family of listFamilies()) expect(family.relations.length, family.id).toBeGreaterThan(0);
  });
});

describe.each(table)('%s', (_, relation) => {
  it('reads, and works from its inputs to its output', () => {
    const known = new Set(relation.inputs.map(({ symbol }) => symbol));
    for (const { gives, from, own } of steps(relation)) {
      const uses = from.flatMap(symbolsOf).filter((symbol) => !(own && symbol === gives));
      expect(
        uses.filter((symbol) => !known.has(symbol)),
        `used before it is known for ${gives}`,
      ).toEqual([]);
      known.add(gives);
    }
    expect(steps(relation).at(-1)?.gives).toBe(relation.output.symbol);
  });

  it('needs every input, for the formula or for a condition', () => {
    const used = new Set([
      ...steps(relation).flatMap(({ from }) => from.flatMap(symbolsOf)),
      ...readRelation(relation).validity.flatMap(({ expression }) => symbolsOf(expression)),
    ]);
    expect(relation.inputs.map(({ symbol }) => symbol).filter((symbol) => !used.has(symbol))).toEqual([]);
  });

  it('declares what its conditions need, and asks for nothing beside', () => {
    const worked = new Set([
      ...relation.inputs.map(({ symbol }) => symbol),
      ...steps(relation).map(({ gives }) => gives),
    ]);
    const needed = readRelation(relation).validity.flatMap(({ expression }) => symbolsOf(expression));
    const beside = [...new Set(needed.filter((symbol) => !worked.has(symbol)))].sort();
    expect(relation.validitySymbols.map(({ symbol }) => symbol).sort()).toEqual(beside);
  });

  it('has units that resolve, and says of every temperature whether it is a difference', () => {
    for (const { symbol, unit, quantity, temperature } of [...declared(relation), relation.output]) {
      expect(resolveUnit(unit), `${symbol} in ${unit}`).toBeDefined();
      expect(quantity, symbol).not.toBe('');
      expect(temperature !== undefined, symbol).toBe(unit === 'K' || unit === 'degC');
    }
  });

  it('states title, source, property temperature and wall condition', () => {
    for (const text of [relation.title, relation.authors, relation.source, relation.propertyTemperature])
      expect(text.trim()).not.toBe('');
    expect(['constant wall temperature', 'constant flux', 'any']).toContain(relation.wallCondition);
    expect(relation.year).toMatch(/^(\d{4})?$/);
  });

  it('has a stated accuracy in words wherever it has one in figures', () => {
    if (relation.relativeAccuracy === undefined) return expect(relation.accuracyBands).toBeUndefined();
    expect(relation.accuracy).not.toBe('');
    expect(relation.relativeAccuracy).toBeGreaterThan(0);
    expect(relation.relativeAccuracy).toBeLessThanOrEqual(1);
  });

  it('typesets', () => {
    const { formula, validity } = readRelation(relation);
    const expressions = [
      ...formula.flatMap((line) =>
        line.kind === 'assignment' ? [line.expression] : [line.low, line.high, line.equation],
      ),
      ...validity.map(({ expression }) => expression),
    ];
    const latex = [
      ...expressions.map(expressionLatex),
      ...[...declared(relation), relation.output].map(({ symbol }) => symbolLatex(symbol)),
    ];
    for (const each of latex) expect(() => katex.renderToString(each, { throwOnError: true }), each).not.toThrow();
  });

  it('has a result inside its range', () => {
    const inside = checkRowsOf(relation.id).filter(({ inputs }) => {
      const grades = Object.values(judged(relation.id, inputs)).map(({ grade }) => grade);
      return worstGrade(grades) !== 'outside';
    });
    expect(inside.length).toBeGreaterThan(0);
  });
});
