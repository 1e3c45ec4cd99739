export type StripMark = 'ok' | 'changed' | 'none';

/** Above this number one mark stands for several cells, so that the strip stays readable. */
const mostMarks = 40;

/** The marks of a strip in order; with many cells each kind keeps its share, and never vanishes. */
export function stripMarks(ticked: number, changed: number, total: number): StripMark[] {
  const none = Math.max(0, total - ticked - changed);
  const scale = total > mostMarks ? mostMarks / total : 1;
  const share = (count: number) => (count === 0 ? 0 : Math.max(1, Math.round(count * scale)));
  return [
    ...Array<StripMark>(share(ticked)).fill('ok'),
    ...Array<StripMark>(share(changed)).fill('changed'),
    ...Array<StripMark>(share(none)).fill('none'),
  ];
}

/** Width of one mark in px: at most 6, and so that all fit into the room. */
export function stripMarkWidth(marks: number, room: number, gap: number): number {
  if (marks === 0) return 0;
  return Math.min(6, Math.max(2, Math.floor((room + gap) / marks) - gap));
}
