// After a build: what the browser must fetch before the first page can show, as gzip. Run by the build itself.
import { existsSync, readFileSync } from 'node:fs';
import { dirname, join, posix } from 'node:path';
import { fileURLToPath } from 'node:url';
import { gzipSync } from 'node:zlib';

const limit = 200_000;
const spa = join(dirname(fileURLToPath(import.meta.url)), '..', '..', 'dist', 'spa');

/** Static imports (`import…from"./x.js"`, `import"./x.js"`, `export…from"./x.js"`) of a built file; not `import()`. */
function staticImports(source) {
  const pattern = /(?:\bfrom|\bimport)\s*"(\.{1,2}\/[^"]+\.js)"/g;
  return [...source.matchAll(pattern)].map((match) => match[1]);
}

/** The entry files of index.html, and everything that they import before they run. */
function entryGraph(html) {
  const pattern = /(?:src|href)=["']?\/?(assets\/[^"'\s>]+\.js)/g;
  const waiting = [...html.matchAll(pattern)].map((match) => match[1]);
  const sizes = new Map();
  for (let file = waiting.pop(); file !== undefined; file = waiting.pop()) {
    const path = join(spa, file);
    if (sizes.has(file) || !existsSync(path)) continue;
    const bytes = readFileSync(path);
    sizes.set(file, gzipSync(bytes, { level: 9 }).length);
    for (const imported of staticImports(bytes.toString('utf8'))) {
      waiting.push(posix.join(posix.dirname(file), imported));
    }
  }
  return sizes;
}

const sizes = entryGraph(readFileSync(join(spa, 'index.html'), 'utf8'));
const total = [...sizes.values()].reduce((sum, size) => sum + size, 0);
const kilobytes = (bytes) => `${(bytes / 1000).toFixed(1)} kB`;
for (const [file, size] of [...sizes].sort((a, b) => b[1] - a[1]))
  console.log(`  ${kilobytes(size).padStart(9)}  ${file}`);
console.log(`first load: ${kilobytes(total)} of JavaScript, gzip (limit ${kilobytes(limit)})`);
if (sizes.size === 0 || total > limit) {
  console.error(
    sizes.size === 0 ? 'no entry file was found in dist/spa/index.html' : 'the first load is over its limit',
  );
  process.exit(1);
}
