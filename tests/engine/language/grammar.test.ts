import { buildParserFile } from '@lezer/generator';
import { highlightTree, tagHighlighter, tags } from '@lezer/highlight';
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { calculationParser } from '../../../src/engine/language/index';

const folder = new URL('../../../src/engine/language/grammar/', import.meta.url);
const read = (name: string) => readFileSync(new URL(name, folder), 'utf8');

describe('the grammar', () => {
  it('has its parser made anew after the last change (npm run grammar)', () => {
    const made = buildParserFile(read('wallflux.grammar'), { typeScript: true, fileName: 'wallflux.grammar' });
    expect(read('parser.ts').trim()).toBe(made.parser.trim());
    expect(read('parser.terms.ts').trim()).toBe(made.terms.trim());
  });

  it('gives the editor what to colour', () => {
    const source = 'rho_w = 998 kg/m^3 # cold\nrequire w.cp >= sqrt(a) to';
    const names = tagHighlighter([
      { tag: tags.unit, class: 'unit' },
      { tag: tags.number, class: 'number' },
      { tag: tags.keyword, class: 'keyword' },
      { tag: tags.lineComment, class: 'note' },
      { tag: tags.propertyName, class: 'member' },
      { tag: tags.function(tags.variableName), class: 'function' },
      { tag: tags.definition(tags.variableName), class: 'definition' },
      { tag: tags.variableName, class: 'name' },
    ]);
    const found: string[] = [];
    highlightTree(calculationParser.parse(source), names, (from, to, classes) => {
      found.push(`${classes} ${source.slice(from, to)}`);
    });
    expect(found).toEqual([
      'definition rho_w',
      'number 998',
      'unit kg/m^3',
      'note # cold',
      'keyword require',
      'member w.cp',
      'function sqrt',
      'name a',
      'keyword to',
    ]);
  });
});
