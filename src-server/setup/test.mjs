// `npm test`: installs what the tests need, brings up their database, runs all of them and ends
// with a line `N passed, N failed`. Further words go to Vitest: `npm test -- tests/engine`.
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { ensurePostgres } from './postgres.mjs';
import {
  checkNode,
  ensureBuild,
  ensurePackages,
  giveUp,
  installDebianPackages,
  needDiskSpace,
  root,
  run,
  say,
} from './surroundings.mjs';

const wanted = process.argv.slice(2);

checkNode();
needDiskSpace(root, 500);
ensurePackages();
if (!existsSync('/usr/bin/chromium'))
  installDebianPackages(['chromium', 'fonts-dejavu-core'], 'Chromium for the browser tests');
if (!existsSync('/usr/bin/pdftotext'))
  installDebianPackages(['poppler-utils'], 'poppler-utils for reading printed reports');
await ensurePostgres('test');
ensureBuild();

say(
  wanted.length > 0 ? `running tests: ${wanted.join(' ')}` : 'running all tests (unit, application, server, browser)',
);
const place = mkdtempSync(join(tmpdir(), 'wallflux-tests-'));
const report = join(place, 'report.json');
const vitest = join(root, 'node_modules', '.bin', 'vitest');
const green = run(vitest, ['run', '--reporter=default', '--reporter=json', `--outputFile.json=${report}`, ...wanted]);
if (!existsSync(report)) giveUp('the test runner ended without a report; its messages are above.');
const { numPassedTests, numFailedTests, numFailedTestSuites, numPendingTests, testResults } = JSON.parse(
  readFileSync(report, 'utf8'),
);
rmSync(place, { recursive: true, force: true });

// A file that could not even be loaded has no failed test of its own; it counts as one.
const unloaded = testResults.filter(
  (file) => file.status === 'failed' && file.assertionResults.every((test) => test.status !== 'failed'),
).length;
const failed = numFailedTests + unloaded + (green || numFailedTests + unloaded + numFailedTestSuites > 0 ? 0 : 1);
console.log(`${numPassedTests} passed, ${failed} failed${numPendingTests > 0 ? `, ${numPendingTests} skipped` : ''}`);
process.exit(failed === 0 && numPassedTests > 0 ? 0 : 1);
