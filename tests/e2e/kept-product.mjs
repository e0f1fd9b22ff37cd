/** The product that `start-product.mjs` started, for `stop-product.mjs`: Jest passes nothing between the two. */

/** @typedef {{ child: import('node:child_process').ChildProcess, data: string }} Product */

/** @type {Product | undefined} */
let kept;

/** @param {Product} product */
export const keepProduct = (product) => {
  kept = product;
};

export const keptProduct = () => kept;
