/** What is watched beside a run: the memory of the server by Linux's own mark, what lies on its disk and in its database, and others that ask. */
import { readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import postgres from 'postgres';

const mebibyteOfKibibytes = 1024;
const statusOf = (processId: number, field: 'VmHWM' | 'VmRSS'): number => {
  const kibibytes = new RegExp(`^${field}:\\s+(\\d+)`, 'm').exec(readFileSync(`/proc/${processId}/status`, 'utf8'))?.[1];
  return Number(kibibytes) / mebibyteOfKibibytes;
};

export const residentMb = (processId: number): number => statusOf(processId, 'VmRSS');
export const mostResidentMb = (processId: number): number => statusOf(processId, 'VmHWM');
/** From here on, the most is counted anew (proc(5), clear_refs). */
export const forgetMost = (processId: number): void => writeFileSync(`/proc/${processId}/clear_refs`, '5');

/** Files of some folders and rows of images. */
export function openInventory(databaseUrl: string, folders: readonly string[]) {
  const sql = postgres(databaseUrl, { max: 1 });
  return {
    async count(): Promise<number> {
      const [row] = await sql`select count(*)::int as images from images`;
      const files = folders.map(
        (folder) => readdirSync(folder, { recursive: true, withFileTypes: true }).filter((entry) => entry.isFile()).length,
      );
      return files.reduce((sum, count) => sum + count, Number(row?.images));
    },
    close: () => sql.end(),
  };
}

export const objectsOf = (dataFolder: string): string => join(dataFolder, 'objects');

/** Somebody who asks for the cases again and again while the files come in. */
export function openOthers(origin: string, cookie: string) {
  const times: number[] = [];
  let failures = 0;
  let stopped = false;
  const asking = (async () => {
    while (!stopped) {
      const before = performance.now();
      try {
        const response = await fetch(`${origin}/api/cases`, { headers: { cookie } });
        await response.arrayBuffer();
        if (!response.ok) failures++;
      } catch {
        // A server that is gone answers nobody: the figure of failures says so.
        failures++;
      }
      times.push(performance.now() - before);
      await new Promise((resolve) => setTimeout(resolve, 25));
    }
  })();
  return {
    async stop() {
      stopped = true;
      await asking;
      times.sort((a, b) => a - b);
      return { p95: times[Math.floor(times.length * 0.95)] ?? NaN, requests: times.length, failures };
    },
  };
}
