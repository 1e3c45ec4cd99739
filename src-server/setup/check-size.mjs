// After a build: what the browser must fetch before the first page can show, as gzip. Run by the build itself.
import { existsSync, readFileSync, readdirSync } from 'node:fs';
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

/** These files, and everything that they import before they run, with their sizes as gzip. */
function graphOf(files) {
  const waiting = [...files];
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

const assets = readdirSync(join(spa, 'assets')).filter((file) => file.endsWith('.js'));
const page = (name) => assets.filter((file) => file.startsWith(`${name}-`)).map((file) => `assets/${file}`);
const html = readFileSync(join(spa, 'index.html'), 'utf8');
const entry = [...html.matchAll(/(?:src|href)=["']?\/?(assets\/[^"'\s>]+\.js)/g)].map((match) => match[1]);
const firstPages = { 'sign-in': page('SignInPage'), register: [...page('MainLayout'), ...page('RegisterPage')] };

if (entry.length === 0) {
  console.error('no entry file was found in dist/spa/index.html');
  process.exit(1);
}
const kilobytes = (bytes) => `${(bytes / 1000).toFixed(1)} kB`;
for (const [name, files] of Object.entries(firstPages)) {
  const total = [...graphOf([...entry, ...files]).values()].reduce((sum, size) => sum + size, 0);
  console.log(`first load of ${name}: ${kilobytes(total)} of JavaScript, gzip (limit ${kilobytes(limit)})`);
  if (total > limit) process.exitCode = 1;
}
