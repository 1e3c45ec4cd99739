/** A measured block: its height in px, and whether it must stand on the page of the next one. */
export interface MeasuredBlock {
  height: number;
  keepWithNext: boolean;
}

/**
 * Lays blocks on pages: fills each page up to `capacity`, never splits a block, never leaves a
 * heading at the foot of a page. Answers, for each page, the indices of its blocks.
 * A block higher than a page gets a page of its own.
 */
export function layOutPages(blocks: readonly MeasuredBlock[], capacity: number): number[][] {
  const pages: number[][] = [];
  let page: number[] = [];
  let used = 0;
  const turn = () => {
    if (page.length > 0) pages.push(page);
    page = [];
    used = 0;
  };
  let index = 0;
  while (index < blocks.length) {
    let end = index;
    while (end < blocks.length - 1 && blocks[end]?.keepWithNext === true) end += 1;
    const group = blocks.slice(index, end + 1);
    const height = group.reduce((sum, block) => sum + block.height, 0);
    if (used > 0 && used + height > capacity) turn();
    for (let member = index; member <= end; member += 1) {
      const own = blocks[member]?.height ?? 0;
      // A kept group that is higher than a page has to be parted somewhere.
      if (used > 0 && used + own > capacity) turn();
      page.push(member);
      used += own;
    }
    index = end + 1;
  }
  turn();
  return pages;
}
