/** The cluster that `start.mjs` opened, for `stop.mjs`: Jest loads both in one process and passes nothing between them. */

/** @type {import('../../db/cluster.mjs').Cluster | undefined} */
let kept;

/** @param {import('../../db/cluster.mjs').Cluster} cluster */
export const keepCluster = (cluster) => {
  kept = cluster;
};

export const keptCluster = () => kept;
