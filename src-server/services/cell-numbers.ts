import type { ExchangeCalculation } from '#document';

/** Number of each cell as the sheet shows it, section and place in it (`2.3`), by the cell's id. */
export function cellNumbers(content: Pick<ExchangeCalculation, 'cells'>): Map<string, string> {
  let section = 0;
  let within = 0;
  return new Map(
    content.cells.map((cell) => {
      if (cell.kind === 'section') {
        section += 1;
        within = 0;
        return [cell.id, String(section)];
      }
      within += 1;
      return [cell.id, `${section}.${within}`];
    }),
  );
}
