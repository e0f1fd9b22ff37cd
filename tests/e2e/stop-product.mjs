/** After the tests in the browser: stops the product as Ctrl-C does, and removes its data folder. */
import { once } from 'node:events';
import { rmSync } from 'node:fs';
import { keptProduct } from './kept-product.mjs';

export default async function stopProduct() {
  const product = keptProduct();
  if (product === undefined) return;
  const { child, data } = product;
  const ended = child.exitCode === null ? once(child, 'exit') : Promise.resolve();
  child.kill('SIGTERM');
  await ended;
  rmSync(data, { recursive: true, force: true });
}
