/** Where a remark would like to stand, and how high it is. */
export interface MarginItem {
  key: string;
  /** Top of its cell. */
  wanted: number;
  height: number;
}

/** Remarks keep to the top of their cell and push later ones down; they never overlap. */
export function layMargin(items: readonly MarginItem[], gap: number): Map<string, number> {
  const tops = new Map<string, number>();
  let free = 0;
  for (const item of [...items].sort((a, b) => a.wanted - b.wanted)) {
    const top = Math.max(item.wanted, free);
    tops.set(item.key, top);
    free = top + item.height + gap;
  }
  return tops;
}

/** From the tick in Check to the head of the remark; bent where the remark was pushed down. */
export function leaderPath(from: number, to: number): string {
  return from === to ? `M0 ${from}H26` : `M0 ${from}H12V${to}H26`;
}
