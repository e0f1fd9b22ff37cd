/** `npm run bench`: measures every figure and prints a table; with `-- --json` the last line is one JSON object for programs. */
import { findProgram } from '../../server/set-up/debian.mjs';
import { causeFigures } from './causes';
import { jsonOf, tableOf } from './figure';
import { growthFigures } from './growth';
import { paneFigures } from './panes';
import { pipelineFigures } from './pipeline';
import { previewFigures } from './preview';
import { requestFigures } from './request';
import { seriesFigures } from './series';
import { transformFigures } from './transform';

/** Debian's Chromium; without it the figures of the panes are left out, aloud. */
function hasBrowser(): boolean {
  const found = findProgram('chromium') !== undefined;
  if (!found) console.error('Chromium is missing: the figures of the panes are left out. As root: apt-get install chromium');
  return found;
}

async function run(): Promise<void> {
  const figures = [
    ...(await transformFigures()),
    ...(await previewFigures()),
    ...(await pipelineFigures()),
    ...(await growthFigures()),
    ...(await causeFigures()),
    ...(await requestFigures()),
    ...(await seriesFigures()),
    ...(hasBrowser() ? await paneFigures() : []),
  ];
  console.log(tableOf(figures));
  if (process.argv.includes('--json')) console.log(jsonOf(figures, new Date()));
}

run().catch((error: unknown) => {
  console.error(error);
  process.exitCode = 1;
});
