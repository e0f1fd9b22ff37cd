/**
 * Runs a program of the system and waits for it. Its output is kept back and shown only when it fails, so that the start prints
 * one line a step.
 */
import { spawn } from 'node:child_process';

/**
 * Something outside the program must change before it can go on; the message says what, and is shown without a stack.
 */
export class SetUpError extends Error {}

/**
 * @typedef {object} CommandOptions
 * @property {string} [cwd]
 * @property {Record<string, string | undefined>} [env] Added to the environment of this process; undefined takes a variable away.
 * @property {AbortSignal} [signal] Ends the program.
 */

/**
 * Runs `program` without a shell and resolves to its exit code and output; rejects with a SetUpError when it cannot be started.
 * @param {string} program
 * @param {readonly string[]} parameters
 * @param {CommandOptions} [options]
 * @returns {Promise<{ code: number, output: string }>}
 */
export function tryCommand(program, parameters, { cwd, env, signal } = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(program, parameters, { cwd, env: { ...process.env, ...env }, signal, stdio: ['ignore', 'pipe', 'pipe'] });
    /** @type {Buffer[]} */
    const chunks = [];
    child.stdout.on('data', (chunk) => chunks.push(chunk));
    child.stderr.on('data', (chunk) => chunks.push(chunk));
    const done = (/** @type {number | null} */ code) => resolve({ code: code ?? 1, output: Buffer.concat(chunks).toString('utf8') });
    child.on('error', (error) => reject(new SetUpError(`${program} cannot be run: ${error.message}`)));
    // 'exit', not 'close': a server that stays behind, as pg_ctl leaves one, keeps its copy of the pipes open.
    child.on('exit', (code) => {
      setImmediate(() => {
        child.stdout.destroy();
        child.stderr.destroy();
        done(code);
      });
    });
  });
}

/**
 * As `tryCommand`, and resolves to the output; rejects with what the program said when it fails.
 * @param {string} program
 * @param {readonly string[]} parameters
 * @param {CommandOptions} [options]
 * @returns {Promise<string>}
 */
export async function runCommand(program, parameters, options) {
  const { code, output } = await tryCommand(program, parameters, options);
  if (code === 0) return output;
  const lastLines = output.trimEnd().split('\n').slice(-40).join('\n');
  throw new SetUpError(`${[program, ...parameters].join(' ')} ended with code ${code}:\n${lastLines}`);
}
