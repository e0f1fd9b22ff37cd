/** `npm run bench`: measures every figure and prints a table; with `-- --json` the last line is one JSON object for programs. */
import { causeFigures } from './causes';
import { jsonOf, tableOf } from './figure';
import { growthFigures } from './growth';
import { pipelineFigures } from './pipeline';
import { previewFigures } from './preview';
import { requestFigures } from './request';
import { seriesFigures } from './series';
import { transformFigures } from './transform';

async function run(): Promise<void> {
  const figures = [
    ...(await transformFigures()),
    ...(await previewFigures()),
    ...(await pipelineFigures()),
    ...(await growthFigures()),
    ...(await causeFigures()),
    ...(await requestFigures()),
    ...(await seriesFigures()),
  ];
  console.log(tableOf(figures));
  if (process.argv.includes('--json')) console.log(jsonOf(figures, new Date()));
}

run().catch((error: unknown) => {
  console.error(error);
  process.exitCode = 1;
});
