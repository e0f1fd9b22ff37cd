/** Objects on disk, and the values of images in memory. */
import { createHash } from 'node:crypto';
import { mkdtemp, readdir, rm, stat, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { openDiskObjects } from '../../server/storage/disk-objects';
import { cachedImageValues } from '../../server/storage/image-values';
import type { ObjectStore } from '../../server/storage/object-store';
import { sessionKey } from '../../server/storage/kept-keys';

let folder: string;
let objects: ObjectStore;
beforeEach(async () => {
  folder = await mkdtemp(join(tmpdir(), 'pickglass-objects-'));
  objects = await openDiskObjects(folder);
});
afterEach(() => rm(folder, { recursive: true, force: true }));

const sha256 = (bytes: Uint8Array) => createHash('sha256').update(bytes).digest('hex');
const files = async () => (await readdir(folder, { recursive: true, withFileTypes: true })).filter((entry) => entry.isFile());

describe('an object', () => {
  it('is found under the SHA-256 of its bytes, readable by its owner only, with no draft left beside it', async () => {
    const bytes = Buffer.from('k-space');
    const digest = await objects.put(bytes);
    expect(digest).toBe(sha256(bytes));
    expect(await objects.get(digest)).toEqual(bytes);
    const [file, ...others] = await files();
    expect(others).toEqual([]);
    expect((await stat(join(file?.parentPath ?? '', file?.name ?? ''))).mode & 0o777).toBe(0o600);
    expect((await stat(folder)).mode & 0o777).toBe(0o700);
  });

  it('is kept once, also when it is put twice at the same moment', async () => {
    const digests = await Promise.all([objects.put(Buffer.from('twice')), objects.put(Buffer.from('twice'))]);
    expect(digests[0]).toBe(digests[1]);
    expect(await files()).toHaveLength(1);
  });

  it('that was damaged on disk is not handed out', async () => {
    const digest = await objects.put(Buffer.from('whole'));
    const [file] = await files();
    await writeFile(join(file?.parentPath ?? '', file?.name ?? ''), 'holes');
    await expect(objects.get(digest)).rejects.toThrow('damaged');
  });

  it('is not looked for under a name that is no digest', async () => {
    await expect(objects.get('../../etc/passwd')).rejects.toThrow(RangeError);
  });
});

describe('the values of images', () => {
  it('stay in memory up to the limit, and the ones used longest ago make room', async () => {
    const reads: string[] = [];
    const counting: ObjectStore = {
      put: objects.put,
      remove: objects.remove,
      get: (digest) => {
        reads.push(digest);
        return objects.get(digest);
      },
    };
    const [a, b, c] = (await Promise.all([1, 2, 3].map((fill) => objects.put(Buffer.alloc(100, fill))))) as [string, string, string];
    const values = cachedImageValues(counting, 200);
    for (const digest of [a, b, a, c, a]) expect(new Uint8Array(await values.read(digest))).toHaveLength(100);
    expect(reads).toEqual([a, b, c]);
    await values.read(b);
    expect(reads).toEqual([a, b, c, b]);
  });

  it('are asked for again after a failure', async () => {
    const digest = sha256(Buffer.from('later'));
    const values = cachedImageValues(objects);
    await expect(values.read(digest)).rejects.toThrow();
    await objects.put(Buffer.from('later'));
    expect(Buffer.from(await values.read(digest)).toString()).toBe('later');
  });
});

it('the key of the sessions is drawn once and kept for its owner only, unless the environment gives one', async () => {
  const first = await sessionKey({ sessionSecret: undefined, dataFolder: folder });
  expect(await sessionKey({ sessionSecret: undefined, dataFolder: folder })).toEqual(first);
  expect(first.length).toBeGreaterThanOrEqual(32);
  expect((await stat(join(folder, 'session-secret'))).mode & 0o777).toBe(0o600);
  expect(await sessionKey({ sessionSecret: 'x'.repeat(40), dataFolder: folder })).toEqual(new TextEncoder().encode('x'.repeat(40)));
});
