/**
 * `npm test`: makes a bare checkout testable as `npm start` makes it runnable, then runs everything: science, server on a throw-away
 * PostgreSQL cluster, components, architecture; and last the product in a real browser, by itself, so that it has the cores.
 *
 * `npm test -- recon browser` runs those projects only; any other word is a pattern for paths of test files. The last line counts.
 */
import { spawn } from 'node:child_process';
import { existsSync, readFileSync, rmSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { openCluster } from '../db/cluster.mjs';
import { temporaryDataFolder } from '../server/set-up/data-folder.mjs';
import { findProgram, installDebianPackage } from '../server/set-up/debian.mjs';
import { ensurePackages } from '../server/set-up/packages.mjs';
import { findOrInstallPostgres } from '../server/set-up/postgres.mjs';
import { SetUpError } from '../server/set-up/run-command.mjs';
import { secondsSince, step } from '../server/set-up/steps.mjs';

/** @typedef {{ passed: number, failed: number, skipped: number }} Counts */

const root = join(dirname(fileURLToPath(import.meta.url)), '..');
const started = performance.now();
const interrupted = new AbortController();
const browserProject = 'browser';
const otherProjects = ['recon', 'server', 'components', 'architecture'];
const words = process.argv.slice(2);
const chosen = words.filter((word) => word === browserProject || otherProjects.includes(word));
const patterns = words.filter((word) => !chosen.includes(word));
const isChosen = (/** @type {string} */ project) => chosen.length === 0 || chosen.includes(project);

async function ensureChromium() {
  if (['chromium', 'chromium-browser', 'google-chrome'].some(findProgram)) return { note: 'found', result: undefined };
  await installDebianPackage('chromium', 'Chromium');
  return { note: "Debian's package installed", result: undefined };
}

/** The tests of the DICOM node have a real scanner's programs for a client. */
async function ensureDcmtk() {
  if (findProgram('storescu') && findProgram('echoscu')) return { note: 'found', result: undefined };
  await installDebianPackage('dcmtk', "dcmtk, the tests' scanner,");
  return { note: "Debian's package installed", result: undefined };
}

/** Others that read what the product hands out: a validator of DICOM, and numpy for Debian's own Python. */
async function ensureReaders() {
  const missing = [];
  if (findProgram('dciodvfy') === undefined) missing.push(['dicom3tools', 'dciodvfy, the validator of DICOM,']);
  if (!existsSync('/usr/lib/python3/dist-packages/numpy')) missing.push(['python3-numpy', "numpy for Debian's Python"]);
  for (const [name = '', what = ''] of missing) await installDebianPackage(name, what);
  return { note: missing.length > 0 ? "Debian's packages installed" : 'found', result: undefined };
}

/**
 * Runs Jest and counts.
 * @param {readonly string[]} projects
 * @param {readonly string[]} parameters
 * @param {Record<string, string>} env
 * @param {string} folder For the report.
 * @returns {Promise<Counts>}
 */
async function runJest(projects, parameters, env, folder) {
  if (projects.length === 0) return { passed: 0, failed: 0, skipped: 0 };
  const report = join(folder, `${projects[0]}.json`);
  const program = join(root, 'node_modules', 'jest', 'bin', 'jest.js');
  const reporting = ['--json', '--outputFile', report, '--reporters', 'default', '--passWithNoTests'];
  const call = [program, ...patterns, '--selectProjects', ...projects, ...reporting, ...parameters];
  const code = await new Promise((resolve, reject) => {
    // What --json prints besides the file goes nowhere; people read the reporter on the other stream.
    const stdio = /** @type {import('node:child_process').StdioOptions} */ (['ignore', 'ignore', 'inherit']);
    // A process group of its own: ended as one, with the browser and the product that its tests started.
    const child = spawn(process.execPath, call, { cwd: root, env: { ...process.env, ...env }, stdio, detached: true });
    const endGroup = () => child.pid !== undefined && process.kill(-child.pid, 'SIGTERM');
    interrupted.signal.addEventListener('abort', endGroup);
    child.once('error', reject);
    child.once('exit', (exitCode) => {
      interrupted.signal.removeEventListener('abort', endGroup);
      resolve(exitCode);
    });
  });
  if (!existsSync(report)) return { passed: 0, failed: 1, skipped: 0 };
  return countsOf(JSON.parse(readFileSync(report, 'utf8')), code);
}

/**
 * A file that does not even load fails no test by Jest's count, and a run may fail around its tests: each counts as one failure.
 * @param {Record<string, number>} report
 * @param {number} code
 * @returns {Counts}
 */
function countsOf(report, code) {
  const { numPassedTests = 0, numFailedTests = 0, numRuntimeErrorTestSuites = 0, numPendingTests = 0, numTodoTests = 0 } = report;
  const failed = numFailedTests + numRuntimeErrorTestSuites;
  return { passed: numPassedTests, failed: code !== 0 && failed === 0 ? 1 : failed, skipped: numPendingTests + numTodoTests };
}

/** @param {string} folder */
async function runEverything(folder) {
  await step('packages', () => ensurePackages(root, interrupted.signal));
  const { bin } = await step('PostgreSQL', async () => {
    const found = await findOrInstallPostgres();
    return { note: found.installed ? "Debian's package installed" : found.bin, result: found };
  });
  if (isChosen(browserProject)) await step('Chromium', ensureChromium);
  if (isChosen('server')) await step('dciodvfy, numpy', ensureReaders);
  if (isChosen('server')) await step('dcmtk', ensureDcmtk);

  const cluster = await openCluster({ bin, folder: join(folder, 'postgres'), durable: false });
  try {
    const env = { TEST_DATABASE_URL: cluster.url('postgres') };
    const counts = [await runJest(otherProjects.filter(isChosen), [], env, folder)];
    if (!interrupted.signal.aborted) {
      counts.push(await runJest([browserProject].filter(isChosen), ['--runInBand'], env, folder));
    }
    return counts;
  } finally {
    await cluster.leave();
  }
}

async function main() {
  const folder = temporaryDataFolder('test');
  try {
    const counts = await runEverything(folder);
    const sum = (/** @type {keyof Counts} */ name) => counts.reduce((total, one) => total + one[name], 0);
    const skipped = sum('skipped');
    process.exitCode = sum('failed') > 0 || sum('passed') === 0 || interrupted.signal.aborted ? 1 : 0;
    console.log(`\ntests took ${secondsSince(started)}`);
    console.log(`${sum('passed')} passed, ${sum('failed')} failed${skipped > 0 ? `, ${skipped} skipped` : ''}`);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => interrupted.abort());
await main().catch((error) => {
  console.error(error instanceof SetUpError ? error.message : error);
  console.log('0 passed, 1 failed');
  process.exitCode = 1;
});
