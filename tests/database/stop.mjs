/** After the tests of the server: leaves the cluster that `start.mjs` opened, which stops it unless another run uses it. */
import { keptCluster } from './kept-cluster.mjs';

export default async function stopDatabase() {
  await keptCluster()?.leave();
}
