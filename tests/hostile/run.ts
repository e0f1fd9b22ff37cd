/**
 * `npm run fuzz`: 5,000 broken files, one after the other, through the doors of the production server. Prints what became of each way of
 * breaking, and the figures; `-- --json` for programs, `-- --files N` for another number. A file that did harm is named by its number.
 */
import { mkdtempSync, rmSync } from 'node:fs';
import { loadavg, tmpdir } from 'node:os';
import { join } from 'node:path';
import { freePort } from '../../db/cluster.mjs';
import { jsonOf, tableOf, type Figure } from '../bench/figure';
import { withRealServer, type RealServer } from '../bench/real-server';
import { chanceOf } from './chance';
import { openDoors, type Door } from './doors';
import { openMaterials } from './material';
import { breaks, mutated } from './mutations';
import { forgetMost, mostResidentMb, objectsOf, openInventory, openOthers, residentMb } from './watch';

const seed = 20261201;
const asked = process.argv.indexOf('--files');
const nFiles = asked < 0 ? 5000 : Number(process.argv[asked + 1]);

interface Tally {
  slowest: { ms: number; file: string };
  peak: { mb: number; file: string };
  crashes: string[];
  left: string[];
  readonly codes: Map<string, Map<string, number>>;
}

async function breakIn(server: RealServer, doors: readonly Door[], temporary: string): Promise<Tally> {
  const { processId, databaseUrl, dataFolder } = server;
  const materials = openMaterials();
  const inventory = openInventory(databaseUrl, [objectsOf(dataFolder), temporary]);
  const atRest = residentMb(processId);
  const tally: Tally = { slowest: { ms: 0, file: '' }, peak: { mb: 0, file: '' }, crashes: [], left: [], codes: new Map() };
  let before = await inventory.count();
  for (let number = 0; number < nFiles; number++) {
    const file = mutated(number, materials, chanceOf(seed, `file ${number}`));
    const name = `${number}: ${file.way} of ${file.material.name}`;
    // The ways follow one another: the door changes with each round of them.
    const door = doors[Math.floor(number / Object.keys(breaks).length) % doors.length];
    if (door === undefined) throw new RangeError('doors must have at least one, got none');
    forgetMost(processId);
    const start = performance.now();
    const { code, refused, crash } = await door(file);
    const ms = performance.now() - start;
    const mb = mostResidentMb(processId) - atRest;
    if (ms > tally.slowest.ms) tally.slowest = { ms, file: name };
    if (mb > tally.peak.mb) tally.peak = { mb, file: name };
    if (crash !== undefined) tally.crashes.push(`${name}: ${crash}`);
    const now = await inventory.count();
    if (refused && now !== before) tally.left.push(`${name}: ${now - before} more after ${code}`);
    before = now;
    const codes = tally.codes.get(file.way) ?? new Map<string, number>();
    codes.set(code, (codes.get(code) ?? 0) + 1);
    tally.codes.set(file.way, codes);
  }
  await inventory.close();
  return tally;
}

const lower = (id: string, value: number, unit: string, goal: number, note?: string): Figure => ({
  ...{ id, value, unit, goal, better: 'lower' },
  ...(note === undefined ? {} : { note }),
});

async function run(): Promise<void> {
  const dicomPort = await freePort();
  const temporary = mkdtempSync(join(tmpdir(), 'pickglass-fuzz-'));
  const variables = { TMPDIR: temporary, DICOM_NODE_PORT: String(dicomPort), LOG_LEVEL: 'error' };
  try {
    await withRealServer(async (server) => {
      const { upload, stow, store } = await openDoors(server, dicomPort);
      const others = openOthers(server.origin, server.cookie);
      const tally = await breakIn(server, [upload, stow, upload, store], temporary);
      report(tally, await others.stop());
    }, variables);
  } finally {
    rmSync(temporary, { recursive: true, force: true });
  }
}

function report(tally: Tally, others: { p95: number; requests: number; failures: number }): void {
  for (const [way, codes] of tally.codes) {
    const shares = [...codes].sort((a, b) => b[1] - a[1]).map(([code, count]) => `${code} ${count}`);
    console.log(`${way.padEnd(26)}${shares.join(', ')}`);
  }
  for (const line of [...tally.crashes, ...tally.left]) console.log(line);
  const figures: Figure[] = [
    { id: 'fuzz-files', value: nFiles, unit: 'files', goal: 5000, better: 'higher', note: `load average ${loadavg()[0]?.toFixed(1)}` },
    lower('fuzz-slowest-ms', tally.slowest.ms, 'ms', 2000, tally.slowest.file),
    lower('fuzz-peak-mb', tally.peak.mb, 'MB', 300, `above the server at rest; ${tally.peak.file}`),
    lower('fuzz-crashes', tally.crashes.length, 'files', 0),
    lower('fuzz-left-on-disk', tally.left.length, 'files', 0),
    // Somebody who looks at the cases is not to notice that files are being read.
    lower('fuzz-others-served-p95-ms', others.p95, 'ms', 200, `${others.requests} requests for the cases meanwhile`),
    lower('fuzz-others-failed', others.failures, 'requests', 0),
  ];
  console.log(tableOf(figures));
  if (process.argv.includes('--json')) console.log(jsonOf(figures, new Date()));
  if (tally.crashes.length + tally.left.length + others.failures > 0) process.exitCode = 1;
}

run().catch((error: unknown) => {
  console.error(error);
  process.exitCode = 1;
});
