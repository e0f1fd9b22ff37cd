/**
 * The server as a child process. It reports its steps over the channel between the two, and writes its log to a file in the data
 * folder, so that the terminal keeps what people read.
 */
import { fork } from 'node:child_process';
import { once } from 'node:events';
import { closeSync, existsSync, openSync, readFileSync, renameSync } from 'node:fs';
import { join } from 'node:path';
import { SetUpError } from './run-command.mjs';

/**
 * What the server reports: `server/index.ts` says when.
 * @typedef {{ kind: 'step', text: string, milliseconds: number } | { kind: 'ready', url: string, accountsFile: string }} Report
 */

/**
 * @typedef {object} ServerProcess
 * @property {string} logFile
 * @property {number} processId
 * @property {Promise<string>} ready Resolves to the file of the demo accounts when the server serves; rejects with the end of its log
 *   when it ends before.
 * @property {Promise<unknown>} ended Resolves when the process has ended.
 * @property {() => Promise<void>} stop
 */

/**
 * Starts the server.
 * @param {string} file
 * @param {{ dataFolder: string, env: Record<string, string>, onStep: (text: string, milliseconds: number) => void }} options
 * @returns {ServerProcess}
 */
export function startServer(file, { dataFolder, env, onStep }) {
  const logFile = join(dataFolder, 'server.log');
  if (existsSync(logFile)) renameSync(logFile, join(dataFolder, 'server.previous.log'));
  const log = openSync(logFile, 'a', 0o600);
  const execArgv = ['--enable-source-maps'];
  const child = fork(file, { env: { ...process.env, ...env }, execArgv, stdio: ['ignore', log, log, 'ipc'] });
  closeSync(log);
  const ended = once(child, 'exit');
  const stop = async () => {
    if (child.exitCode === null && child.signalCode === null) child.kill('SIGTERM');
    await ended;
  };
  /** @type {Promise<string>} */
  const ready = new Promise((resolve, reject) => {
    child.on('message', (message) => {
      const report = /** @type {Report} */ (message);
      if (report.kind === 'step') onStep(report.text, report.milliseconds);
      else resolve(report.accountsFile);
    });
    ended.then(() => reject(new SetUpError(`The server ended while it started. ${logFile} says:\n${endOf(logFile)}`)), reject);
  });
  // A child without a number never started, and `ready` says so.
  return { logFile, processId: child.pid ?? 0, ready, ended, stop };
}

/** @param {string} logFile */
const endOf = (logFile) => readFileSync(logFile, 'utf8').trimEnd().split('\n').slice(-20).join('\n');
