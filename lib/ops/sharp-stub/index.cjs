// Next lists sharp as an optional dependency, and sharp brings native image decoders along. The image optimiser is
// off (next.config.mjs) and pictures are re-written by jimp in a child process, so nothing may ever call this.
module.exports = function sharp() {
  throw new Error('sharp is not part of this project: see lib/platform/pictures.');
};
