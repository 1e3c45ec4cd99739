import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { readLines } from '../../../src/engine/language/index';
import { dumpLine } from './dump';

/**
 * Cases as text, tests/cases/*.txt: a title after `===`, the source, a line `---`, and what is read.
 * Expectations were written from the rules of the language (what an engineer would write by hand),
 * not copied from the output.
 */
const folder = new URL('../../cases/', import.meta.url);

interface Case {
  title: string;
  source: string;
  expected: string;
}

function casesOf(file: string): Case[] {
  const text = readFileSync(new URL(file, folder), 'utf8');
  return text
    .split(/^=== /m)
    .slice(1)
    .map((block) => {
      const [title = '', ...rest] = block.split('\n');
      const [source = '', expected = ''] = rest.join('\n').split(/^---\n/m);
      return { title, source: source.replace(/\n$/, ''), expected: expected.trim() };
    });
}

const files = readdirSync(folder).filter((file) => file.endsWith('.txt'));

describe.each(files)('%s', (file) => {
  it.each(casesOf(file))('$title', ({ source, expected }) => {
    const lines = readLines(source).filter((line) => line.kind !== 'blank');
    expect(lines.flatMap((line) => dumpLine(line, source)).join('\n')).toBe(expected);
  });
});
