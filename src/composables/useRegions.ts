/** F6 goes round the regions of the page: whatever carries `data-region`, in the order of the page. */
export function useRegions() {
  const isShown = (element: HTMLElement) => element.getClientRects().length > 0;

  function next(step: 1 | -1): void {
    const regions = [...document.querySelectorAll<HTMLElement>('[data-region]')].filter(isShown);
    if (regions.length === 0) return;
    const here = regions.findIndex((region) => region.contains(document.activeElement));
    const from = here < 0 && step < 0 ? 0 : here;
    const region = regions[(from + step + regions.length) % regions.length];
    if (region === undefined) return;
    const first = [
      ...region.querySelectorAll<HTMLElement>('a[href], button:not(:disabled), input, [tabindex="0"]'),
    ].find(isShown);
    if (first !== undefined) first.focus();
    else {
      region.tabIndex = -1;
      region.focus();
    }
  }
  return { next };
}
