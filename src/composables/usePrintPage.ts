import { onBeforeUnmount, onMounted } from 'vue';

/**
 * Paper and margins for as long as a page is shown (`A4 landscape`, `14mm`). A named page in a style
 * sheet would break before and after itself; a sheet of its own holds for the whole print instead.
 */
export function usePrintPage(size: string, margin: string): void {
  let sheet: CSSStyleSheet | undefined;
  onMounted(() => {
    sheet = new CSSStyleSheet();
    sheet.replaceSync(`@page { size: ${size}; margin: ${margin}; }`);
    document.adoptedStyleSheets.push(sheet);
  });
  onBeforeUnmount(() => {
    document.adoptedStyleSheets = document.adoptedStyleSheets.filter((one) => one !== sheet);
  });
}
