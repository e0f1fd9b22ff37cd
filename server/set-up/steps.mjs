/** The steps of a start, each on one line with what it did and how long that took. */

/** @param {number} since A value of performance.now() */
export const secondsSince = (since) => `${((performance.now() - since) / 1000).toFixed(1)} s`;

/**
 * Does one step. `work` resolves to its result and a note of what was done, in a few words.
 * @template Result
 * @param {string} title
 * @param {() => Promise<{ note: string, result: Result }>} work
 * @returns {Promise<Result>}
 */
export async function step(title, work) {
  const start = performance.now();
  process.stdout.write(`${title.padEnd(12)} `);
  try {
    const { note, result } = await work();
    process.stdout.write(`${note} (${secondsSince(start)})\n`);
    return result;
  } catch (error) {
    process.stdout.write(`failed (${secondsSince(start)})\n`);
    throw error;
  }
}
