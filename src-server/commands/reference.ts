// `npm run -s reference -- relations|properties FILE.csv`: compares the engine with check values.
import { readFileSync } from 'node:fs';
import { compareProperties } from './reference/properties';
import { compareRelations } from './reference/relations';
import type { Summary } from './reference/summary';

const comparisons: Readonly<Record<string, (text: string) => Summary>> = {
  relations: compareRelations,
  properties: compareProperties,
};

function main([kind = '', file = '']: readonly string[]): number {
  const compare = comparisons[kind];
  if (compare === undefined || file === '') {
    console.error('usage: npm run -s reference -- relations|properties FILE.csv');
    return 2;
  }
  try {
    const summary = compare(readFileSync(file, 'utf8'));
    for (const line of summary.lines) console.log(line);
    console.log(`${summary.passed} passed, ${summary.failed} failed, ${summary.skipped} skipped`);
    return summary.failed === 0 ? 0 : 1;
  } catch (error) {
    console.error(`${file} could not be compared: ${error instanceof Error ? error.message : String(error)}`);
    return 2;
  }
}

process.exit(main(process.argv.slice(2)));
