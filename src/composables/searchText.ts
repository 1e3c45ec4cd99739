/** Text as it is compared in a search: small letters without accents, dashes as spaces. */
export function foldForSearch(text: string): string {
  return text
    .normalize('NFD')
    .replace(/\p{M}/gu, '')
    .replace(/[-\u2010-\u2015]/g, ' ')
    .toLowerCase();
}
