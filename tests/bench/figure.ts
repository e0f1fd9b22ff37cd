/** A figure of `npm run bench`: one number with its goal, and the same work of an outside program measured beside it where there is one. */
import { cpus } from 'node:os';

export interface Figure {
  /** Stable: other programs look figures up by it. */
  readonly id: string;
  readonly value: number;
  readonly unit: string;
  readonly goal: number;
  readonly better: 'lower' | 'higher';
  readonly peer?: { readonly name: string; readonly value: number };
  readonly note?: string;
}

/** The engine compiles what runs often in several rounds, as it has in a server that has been up for a second. */
const warmUpMs = 500;

/** Median time of a call in milliseconds, after `warmUp` calls and half a second at least, in which the engine compiles. */
export async function medianMs(work: () => unknown, { calls, warmUp = 5 }: { calls: number; warmUp?: number }): Promise<number> {
  const start = performance.now();
  for (let call = 0; call < warmUp || performance.now() - start < warmUpMs; call++) await work();
  const times: number[] = [];
  for (let call = 0; call < calls; call++) {
    const before = performance.now();
    await work();
    times.push(performance.now() - before);
  }
  times.sort((a, b) => a - b);
  return times[Math.floor(times.length / 2)] ?? NaN;
}

const shown = (value: number): string => (value >= 100 ? value.toFixed(0) : value.toPrecision(3));

/** The figures as lines of a table for people. */
export function tableOf(figures: readonly Figure[]): string {
  const rows = figures.map(({ id, value, unit, goal, better, peer, note }) => [
    id,
    `${shown(value)} ${unit}`,
    `${better === 'lower' ? '≤' : '≥'} ${goal} ${unit}`,
    (better === 'lower' ? value <= goal : value >= goal) ? 'met' : 'missed',
    peer === undefined ? '' : `${peer.name} ${shown(peer.value)} ${unit}`,
    note ?? '',
  ]);
  const table = [['figure', 'value', 'goal', '', 'peer', 'note'], ...rows];
  const widths = (table[0] ?? []).map((_, column) => Math.max(...table.map((row) => (row[column] ?? '').length)));
  return table
    .map((row) =>
      row
        .map((cell, column) => cell.padEnd(widths[column] ?? 0))
        .join('  ')
        .trimEnd(),
    )
    .join('\n');
}

/** The figures as one line for programs. */
export const jsonOf = (figures: readonly Figure[], at: Date): string =>
  JSON.stringify({ figures, machine: { cores: cpus().length, node: process.version }, at: at.toISOString() });
