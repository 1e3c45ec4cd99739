/** Records of a CSV text (RFC 4180) as objects by column name; throws with the line number on a ragged row. */
export function readCsv(text: string): Record<string, string>[] {
  const rows = splitRows(text.replace(/^\uFEFF/, ''));
  const [header, ...records] = rows;
  if (header === undefined) return [];
  return records.map((cells, index) => {
    if (cells.length !== header.length)
      throw new Error(`row ${index + 2} has ${cells.length} cells, the header ${header.length}`);
    return Object.fromEntries(header.map((name, column) => [name, cells[column] ?? '']));
  });
}

function splitRows(text: string): string[][] {
  const rows: string[][] = [];
  let row: string[] = [];
  let cell = '';
  let quoted = false;
  for (let at = 0; at < text.length; at += 1) {
    const sign = text[at] ?? '';
    if (quoted) {
      if (sign !== '"') cell += sign;
      else if (text[at + 1] === '"') {
        cell += '"';
        at += 1;
      } else quoted = false;
    } else if (sign === '"') quoted = true;
    else if (sign === ',') {
      row.push(cell);
      cell = '';
    } else if (sign === '\n') {
      rows.push([...row, cell]);
      row = [];
      cell = '';
    } else if (sign !== '\r') cell += sign;
  }
  if (cell !== '' || row.length > 0) rows.push([...row, cell]);
  return rows.filter((cells) => cells.length > 1 || cells[0] !== '');
}
