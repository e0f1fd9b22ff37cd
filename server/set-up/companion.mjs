/** A program that runs beside this one until it is told to stop: the two halves of `npm run dev`. */
import { spawn } from 'node:child_process';
import { once } from 'node:events';

/**
 * @param {readonly string[]} parameters Of Node.js.
 * @param {{ cwd: string, env: Record<string, string> }} options
 * @returns {{ ended: Promise<unknown>, stop: () => Promise<void> }}
 */
export function startCompanion(parameters, { cwd, env }) {
  // A process group of its own: what it starts ends with it, and Ctrl-C reaches it through `stop` alone.
  const child = spawn(process.execPath, parameters, {
    cwd,
    env: { ...process.env, ...env },
    stdio: ['ignore', 'inherit', 'inherit'],
    detached: true,
  });
  const ended = once(child, 'exit');
  const stop = async () => {
    const { pid } = child;
    if (pid !== undefined && child.exitCode === null && child.signalCode === null) process.kill(-pid, 'SIGTERM');
    await ended;
  };
  return { ended, stop };
}
