import { onBeforeUnmount, onMounted, ref, type Ref } from 'vue';
import type { SheetCell } from './sheetContext';
import { cellElement } from './useFocusCell';

/** Height of the running head: what lies above it is out of sight. */
const headHeight = 60;

/** The section that the topmost visible cell belongs to, for the running head and the contents. */
export function useTopSection(cells: Readonly<Ref<readonly SheetCell[]>>) {
  const topId = ref<string>();
  let asked = 0;

  function look(): void {
    asked = 0;
    const heads = cells.value.filter((cell) => cell.kind === 'section');
    const above = heads.filter((cell) => (cellElement(cell.id)?.getBoundingClientRect().top ?? Infinity) <= headHeight);
    topId.value = (above.at(-1) ?? heads[0])?.id;
  }
  function ask(): void {
    if (asked === 0) asked = requestAnimationFrame(look);
  }
  onMounted(() => {
    window.addEventListener('scroll', ask, { passive: true });
    window.addEventListener('resize', ask, { passive: true });
    ask();
  });
  onBeforeUnmount(() => {
    window.removeEventListener('scroll', ask);
    window.removeEventListener('resize', ask);
    cancelAnimationFrame(asked);
  });
  return { topId, look: ask };
}
