/** Metro finds its preset by itself; Jest needs it named. */
module.exports = (api) => {
  api.cache(true);
  return { presets: ['babel-preset-expo'] };
};
