/** A bitmap alphabet of our own, five columns by seven rows a letter, for the words that are burned into simulated pictures. */

export interface Levels {
  readonly width: number;
  readonly height: number;
  /** Grey levels, row-major. */
  readonly levels: Uint8Array | Uint16Array;
}

/** One row a string. */
const letters: Readonly<Record<string, readonly string[]>> = {
  A: [' ### ', '#   #', '#   #', '#####', '#   #', '#   #', '#   #'],
  D: ['#### ', '#   #', '#   #', '#   #', '#   #', '#   #', '#### '],
  E: ['#####', '#    ', '#    ', '#### ', '#    ', '#    ', '#####'],
  F: ['#####', '#    ', '#    ', '#### ', '#    ', '#    ', '#    '],
  G: [' ### ', '#   #', '#    ', '# ###', '#   #', '#   #', ' ####'],
  I: [' ### ', '  #  ', '  #  ', '  #  ', '  #  ', '  #  ', ' ### '],
  L: ['#    ', '#    ', '#    ', '#    ', '#    ', '#    ', '#####'],
  M: ['#   #', '## ##', '# # #', '# # #', '#   #', '#   #', '#   #'],
  N: ['#   #', '##  #', '# # #', '#  ##', '#   #', '#   #', '#   #'],
  O: [' ### ', '#   #', '#   #', '#   #', '#   #', '#   #', ' ### '],
  R: ['#### ', '#   #', '#   #', '#### ', '# #  ', '#  # ', '#   #'],
  S: [' ### ', '#   #', '#    ', ' ### ', '    #', '#   #', ' ### '],
  T: ['#####', '  #  ', '  #  ', '  #  ', '  #  ', '  #  ', '  #  '],
  U: ['#   #', '#   #', '#   #', '#   #', '#   #', '#   #', ' ### '],
  ',': ['     ', '     ', '     ', '     ', ' ##  ', '  #  ', ' #   '],
};

/** From the left edge of a letter to that of the next, in dots. */
export const advance = 6;
export const letterHeight = 7;

export interface Writing {
  readonly text: string;
  readonly left: number;
  readonly top: number;
  readonly white: number;
  /** Pixels of a dot's side. */
  readonly dot?: number;
}

/** Writes `text`; what falls outside the picture is an error of the caller. */
export function writeText({ width, levels }: Levels, { text, left, top, white, dot = 1 }: Writing): void {
  [...text].forEach((letter, place) => {
    letters[letter]?.forEach((pattern, row) => {
      for (let y = 0; y < dot; y++) {
        [...pattern].forEach((mark, column) => {
          if (mark !== '#') return;
          const from = (top + row * dot + y) * width + left + (place * advance + column) * dot;
          levels.fill(white, from, from + dot);
        });
      }
    });
  });
}

const dash = 4;

/** A dashed line along the four edges. */
export function drawFrame({ width, height, levels }: Levels, white: number): void {
  const level = (along: number): number => (Math.floor(along / dash) % 2 === 0 ? white : 0);
  for (let x = 0; x < width; x++) {
    levels[x] = level(x);
    levels[(height - 1) * width + x] = level(x);
  }
  for (let y = 0; y < height; y++) {
    levels[y * width] = level(y);
    levels[y * width + width - 1] = level(y);
  }
}
