import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { layOutPages } from 'src/composables/reportPages';

const block = (height: number, keepWithNext = false) => ({ height, keepWithNext });

describe('laying blocks on pages', () => {
  it('fills a page before it turns to the next', () => {
    expect(layOutPages([block(40), block(40), block(40)], 100)).toEqual([[0, 1], [2]]);
  });

  it('takes a heading over to the page of what it heads', () => {
    expect(layOutPages([block(70), block(20, true), block(40)], 100)).toEqual([[0], [1, 2]]);
  });

  it('gives a block that is higher than a page a page of its own', () => {
    expect(layOutPages([block(10), block(300), block(10)], 100)).toEqual([[0], [1], [2]]);
  });

  it('has no page for no block', () => {
    expect(layOutPages([], 100)).toEqual([]);
  });

  it('keeps every block once, in order, on pages that are not overfull', () => {
    const blocks = fc.array(fc.record({ height: fc.integer({ min: 1, max: 100 }), keepWithNext: fc.boolean() }), {
      maxLength: 60,
    });
    fc.assert(
      fc.property(blocks, (all) => {
        const pages = layOutPages(all, 100);
        expect(pages.flat()).toEqual(all.map((_, index) => index));
        for (const page of pages) {
          const used = page.reduce((sum, index) => sum + (all[index]?.height ?? 0), 0);
          expect(used).toBeLessThanOrEqual(100);
        }
      }),
    );
  });
});
