/** The word SIMULATED on a black strip and a dashed frame, burned into a small picture: it must never pass for a scan. */

/** Five columns by seven rows a letter, one row a string. */
const letters: Readonly<Record<string, readonly string[]>> = {
  S: [' ### ', '#   #', '#    ', ' ### ', '    #', '#   #', ' ### '],
  I: [' ### ', '  #  ', '  #  ', '  #  ', '  #  ', '  #  ', ' ### '],
  M: ['#   #', '## ##', '# # #', '# # #', '#   #', '#   #', '#   #'],
  U: ['#   #', '#   #', '#   #', '#   #', '#   #', '#   #', ' ### '],
  L: ['#    ', '#    ', '#    ', '#    ', '#    ', '#    ', '#####'],
  A: [' ### ', '#   #', '#   #', '#####', '#   #', '#   #', '#   #'],
  T: ['#####', '  #  ', '  #  ', '  #  ', '  #  ', '  #  ', '  #  '],
  E: ['#####', '#    ', '#    ', '#### ', '#    ', '#    ', '#####'],
  D: ['#### ', '#   #', '#   #', '#   #', '#   #', '#   #', '#### '],
};
const word = 'SIMULATED';
const advance = 6;
const letterHeight = 7;
const stripHeight = letterHeight + 4;
const dash = 4;

interface Levels {
  readonly width: number;
  readonly height: number;
  readonly levels: Uint8Array;
}

/** Changes `picture`. On one too small for the word the frame alone says it. */
export function burnSimulated(picture: Levels): void {
  if (picture.width >= word.length * advance + 2 && picture.height >= 2 * stripHeight) writeWord(picture);
  drawFrame(picture);
}

function writeWord({ width, height, levels }: Levels): void {
  const top = height - stripHeight;
  levels.fill(0, top * width);
  const left = Math.floor((width - word.length * advance) / 2);
  [...word].forEach((letter, place) => {
    letters[letter]?.forEach((pattern, y) => {
      [...pattern].forEach((dot, x) => {
        if (dot === '#') levels[(top + 2 + y) * width + left + place * advance + x] = 255;
      });
    });
  });
}

function drawFrame({ width, height, levels }: Levels): void {
  const level = (along: number): number => (Math.floor(along / dash) % 2 === 0 ? 255 : 0);
  for (let x = 0; x < width; x++) {
    levels[x] = level(x);
    levels[(height - 1) * width + x] = level(x);
  }
  for (let y = 0; y < height; y++) {
    levels[y * width] = level(y);
    levels[y * width + width - 1] = level(y);
  }
}
