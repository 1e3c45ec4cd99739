import { onBeforeUnmount, onMounted, ref, type Ref } from 'vue';

/** Whether a strip holds more than its width: then it has to be reachable by keyboard. */
export function useScrollable(element: Readonly<Ref<HTMLElement | undefined>>) {
  const scrollable = ref(false);
  let observer: ResizeObserver | undefined;

  function look(): void {
    const strip = element.value;
    scrollable.value = strip !== undefined && strip !== null && strip.scrollWidth > strip.clientWidth + 1;
  }
  onMounted(() => {
    if (element.value === undefined) return;
    observer = new ResizeObserver(look);
    observer.observe(element.value);
    for (const child of element.value.children) observer.observe(child);
  });
  onBeforeUnmount(() => observer?.disconnect());
  return scrollable;
}
