/**
 * The life of a program that starts others: what was started is stopped again, in reverse order, on Ctrl-C, on SIGTERM, when the
 * terminal closes, and when a step fails.
 */
import { SetUpError } from './run-command.mjs';

/**
 * @typedef {object} Lifetime
 * @property {AbortSignal} signal Aborts when the end has begun.
 * @property {(undo: () => Promise<void>) => void} atEnd Remembers how to stop what was just started.
 * @property {(why: unknown) => Promise<void>} fail Ends the program with code 1, and says why unless it is ending already.
 */

/**
 * Runs `main` until somebody ends it.
 * @param {(life: Lifetime) => Promise<void>} main
 */
export async function live(main) {
  const ending = new AbortController();
  /** @type {(() => Promise<void>)[]} */
  const undo = [];
  /** @type {Promise<void> | undefined} */
  let end;

  const stop = (/** @type {number} */ code) => {
    end ??= (async () => {
      ending.abort();
      for (const close of undo.reverse()) await close();
      process.exit(code);
    })();
    return end;
  };
  const fail = (/** @type {unknown} */ why) => {
    // What a program says while it is being stopped is no news.
    if (end === undefined) console.error(why instanceof SetUpError ? why.message : why);
    return stop(1);
  };

  for (const name of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(name, () => void stop(0));
  await main({ signal: ending.signal, atEnd: (close) => undo.push(close), fail }).catch(fail);
}
