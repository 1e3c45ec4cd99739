import { describe, expect, it } from 'vitest';
import { createEngine, defaultSettings, limits, type CellInput } from '#engine';
import { lines, sheet } from './sheet';

function started(cells: readonly CellInput[]) {
  const engine = createEngine();
  engine.update({ settings: defaultSettings, put: cells, order: cells.map(({ id }) => id) });
  return engine;
}
const idsOf = (delta: { cells: readonly { id: string }[] }) => delta.cells.map(({ id }) => id).sort();

describe('an engine that keeps state', () => {
  const cells = [
    lines('a', 'a = 2'),
    lines('b', 'b = 3*a'),
    lines('c', 'c = min(b, 1)'),
    lines('d', 'd = 2*c'),
    lines('e', 'e = 5'),
  ];

  it('tells only the cells whose result is another', () => {
    expect(idsOf(started(cells).update({ put: [lines('e', 'e = 6')] }))).toEqual(['e']);
    // c stays the same, so that d is not even looked at; c itself shows another b.
    expect(idsOf(started(cells).update({ put: [lines('a', 'a = 4')] }))).toEqual(['a', 'b', 'c']);
  });

  it('tells nothing when nothing changed', () => {
    const engine = started(cells);
    expect(idsOf(engine.update({ put: [lines('b', 'b = 3*a')] }))).toEqual([]);
    expect(idsOf(engine.update({ settings: { ...defaultSettings } }))).toEqual([]);
    expect(idsOf(engine.update({ order: ['e', 'd', 'c', 'b', 'a'] }))).toEqual([]);
  });

  it('tells what is gone, and what missed it', () => {
    const delta = started(cells).update({ remove: ['a'] });
    expect(delta.removed).toEqual(['a']);
    expect(idsOf(delta)).toEqual(['b', 'c', 'd']);
    expect(delta.names.map(({ name }) => name)).toEqual(['b', 'c', 'd', 'e']);
  });

  it('mends a circle when it is broken', () => {
    const engine = started([lines('a', 'a = b'), lines('b', 'b = a')]);
    expect(idsOf(engine.update({ put: [lines('b', 'b = 2')] }))).toEqual(['a', 'b']);
    expect(engine.result().cells.a?.lines[0]?.value?.si).toBe(2);
  });

  it('renews a proposal when the proposed name goes', () => {
    const engine = started([lines('a', 'T_wall = 300 K'), lines('b', 'x = T_wal')]);
    expect(engine.result().cells.b?.diagnostics[0]?.mend?.insert).toBe('T_wall');
    engine.update({ remove: ['a'] });
    expect(engine.result().cells.b?.diagnostics[0]?.mend).toBeUndefined();
  });
});

describe('limits', () => {
  it('a cell that is too long is not computed, and says so', () => {
    const long = lines('a', `a = 2\n${'# more\n'.repeat(limits.sourceLength / 7 + 1)}`);
    const { cells } = sheet([long, lines('b', 'b = 2')]);
    expect(cells.a?.diagnostics.map(({ code }) => code)).toEqual(['TOO_LONG']);
    expect(cells.b?.lines[0]?.value?.si).toBe(2);
  });

  it('cells beyond the number that a sheet may have are not computed, and say so', () => {
    const many = Array.from({ length: limits.cells + 2 }, (_, index) =>
      lines(`c${index}`, index < limits.cells ? '' : 'x = 2'),
    );
    const engine = started(many);
    const codes = () => engine.result().cells[`c${limits.cells}`]?.diagnostics.map(({ code }) => code);
    expect(codes()).toEqual(['TOO_LONG']);
    engine.update({ remove: ['c0'] });
    expect(codes()).toEqual([]);
  });

  it('a sheet without any of its names is read through in time', () => {
    const orphans = Array.from({ length: 1500 }, (_, index) =>
      lines(`c${index}`, `value_${index} = other_${index} + 1`),
    );
    const begin = performance.now();
    expect(sheet(orphans).cells.c7?.diagnostics[0]?.code).toBe('UNKNOWN_NAME');
    expect(performance.now() - begin).toBeLessThan(20_000);
  });

  it('a long chain and a long circle are computed', () => {
    const size = 3000;
    const chain = Array.from(
      { length: size },
      (_, index) => `x_${index} = ${index === 0 ? '1' : `x_${index - 1} + 1`}`,
    );
    expect(sheet([lines('c', chain.reverse().join('\n'))]).names[0]?.value?.si).toBe(size);
    const circle = Array.from({ length: 400 }, (_, index) => `y_${index} = y_${(index + 1) % 400}`);
    const { cells } = sheet([lines('c', circle.join('\n'))]);
    expect(cells.c?.diagnostics).toHaveLength(400);
  });
});
