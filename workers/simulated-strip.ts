/** The word SIMULATED on a black strip and a dashed frame, burned into a small picture: it must never pass for a scan. */
import { advance, drawFrame, letterHeight, writeText, type Levels } from './mark-letters';

const word = 'SIMULATED';
const stripHeight = letterHeight + 4;
const white = 255;

/** Changes `picture`. On one too small for the word the frame alone says it. */
export function burnSimulated(picture: Levels): void {
  const { width, height, levels } = picture;
  if (width >= word.length * advance + 2 && height >= 2 * stripHeight) {
    const top = height - stripHeight;
    levels.fill(0, top * width);
    writeText(picture, { text: word, left: Math.floor((width - word.length * advance) / 2), top: top + 2, white });
  }
  drawFrame(picture, white);
}
