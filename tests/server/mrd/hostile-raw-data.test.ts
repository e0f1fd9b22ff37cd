/** Raw data files that were damaged at random: each is taken or refused with a reason, in its time, and the next whole one is read. */
import { chanceOf } from '../../hostile/chance';
import { openReader, rawFile, type RawName } from './raw-files';

const reader = openReader();
afterAll(() => reader.close());

const names: readonly RawName[] = ['one-coil', 'four-coils', 'slices', 'partial'];
const damaged = 60;
/** As the product's own limit for a file of this size (workers/reading-thread.ts), with the wait for the cores of a busy machine. */
const limitMs = 5_000;

test(`${damaged} damaged files are refused or read, none breaks the reader`, async () => {
  const random = chanceOf(20261201, 'raw data');
  let refused = 0;
  for (let i = 0; i < damaged; i++) {
    const bytes = rawFile(names[i % names.length] ?? 'partial');
    // The structure lies in the first kilobytes, and is hit more often than samples.
    const reach = i % 2 === 0 ? 4096 : bytes.length;
    for (let hit = 0; hit <= i % 8; hit++) bytes[random.below(reach)] = random.below(256);
    const outcome = await reader.read(i % 5 === 0 ? bytes.slice(0, random.below(bytes.length)) : bytes, limitMs);
    if (outcome === undefined || 'refused' in outcome) refused++;
    else expect(outcome.accepted[0]?.values.every(Number.isFinite)).toBe(true);
  }
  expect(refused).toBeGreaterThan(damaged / 10);
  expect(await reader.accepted(rawFile('partial'))).toMatchObject({ rows: 12 });
}, 240_000);
