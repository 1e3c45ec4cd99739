import { describe, expect, it } from 'vitest';
import { readMarkdown, type MarkdownNode } from 'src/composables/useMarkdown';

function flat(nodes: readonly MarkdownNode[]): MarkdownNode[] {
  return nodes.flatMap((node) => (node.type === 'element' ? [node, ...flat(node.children)] : [node]));
}
const links = (source: string) =>
  flat(readMarkdown(source)).flatMap((node) => (node.type === 'element' && node.tag === 'a' ? [node.attributes] : []));
const words = (source: string) =>
  flat(readMarkdown(source))
    .map((node) => (node.type === 'text' ? node.text : ''))
    .join('');

describe('the words of a text cell', () => {
  it.each(['<script>alert(1)</script>', '<img src=x onerror=alert(1)>', 'a <b onclick="x()">b</b>'])(
    'leaves HTML as text: %s',
    (source) => {
      const tags = flat(readMarkdown(source)).flatMap((node) => (node.type === 'element' ? [node.tag] : []));
      expect(tags.every((tag) => tag === 'p')).toBe(true);
      expect(words(source)).toBe(source);
    },
  );

  it.each([
    'javascript:alert(1)',
    'JAVASCRIPT:alert(1)',
    'data:text/html,x',
    'vbscript:x',
    'file:///etc/passwd',
    '//host/x',
  ])('makes no link of %s', (address) => {
    expect(links(`[press](${address})`)).toEqual([]);
  });

  it.each(['https://example.org/a', 'http://example.org', 'mailto:a@example.org'])(
    'links to %s without a way back',
    (address) => {
      expect(links(`[press](${address})`)).toEqual([{ href: address, rel: 'noopener noreferrer', target: '_blank' }]);
    },
  );

  it('shows no pictures', () => {
    const nodes = flat(readMarkdown('![a](https://example.org/a.png)'));
    expect(nodes.some((node) => node.type === 'element' && node.tag === 'img')).toBe(false);
  });

  it('finds mathematics and live values in the line', () => {
    const nodes = flat(readMarkdown('Flow $\\dot V$ is {{V_dot}} at {{ w.rho }}.'));
    expect(nodes.filter((node) => node.type === 'math')).toEqual([{ type: 'math', latex: '\\dot V', display: false }]);
    expect(nodes.filter((node) => node.type === 'value')).toEqual([
      { type: 'value', name: 'V_dot' },
      { type: 'value', name: 'w.rho' },
    ]);
  });

  it('takes no sum of money for mathematics', () => {
    expect(flat(readMarkdown('from 5 $ to 6 $ a day')).some((node) => node.type === 'math')).toBe(false);
  });

  it('sets heads below those of sections', () => {
    const [first] = readMarkdown('# Head');
    expect(first).toMatchObject({ type: 'element', tag: 'h3' });
  });

  it('keeps the items of a tight list in the list', () => {
    const [list] = readMarkdown('- one\n- two');
    expect(list).toMatchObject({ tag: 'ul', children: [{ tag: 'li', children: [{ text: 'one' }] }, { tag: 'li' }] });
  });
});
