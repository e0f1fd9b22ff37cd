/**
 * SIMULATED, NOT FOR DIAGNOSIS on a black strip along the lower edge of every picture that leaves the product. Above the strip each level
 * is as it was. A picture too small for the words is first enlarged by whole pixels, which changes no value either.
 */
import { advance, letterHeight, writeText, type Levels } from './mark-letters';

export const exportedWords = 'SIMULATED, NOT FOR DIAGNOSIS';

/** Dots around the lines and between them. */
const margin = 2;
/** A wider picture is seen smaller: so many columns a dot. */
const columnsPerDot = 320;
/** The strip takes no more of the height than this. */
const largestShare = 1 / 2;

export interface Marked<L extends Levels['levels']> {
  readonly width: number;
  readonly height: number;
  readonly levels: L;
  /** Each pixel became so many, along both sides. */
  readonly enlargement: number;
  /** Rows of the strip. */
  readonly stripHeight: number;
}

interface Strip {
  readonly lines: readonly string[];
  readonly dot: number;
  readonly height: number;
}

/** A marked copy of `picture`. */
export function marked<L extends Uint8Array | Uint16Array>(picture: Levels & { readonly levels: L }, white: number): Marked<L> {
  const { width, height } = picture;
  let enlargement = 1;
  while (stripFor(width * enlargement, height * enlargement) === undefined) enlargement++;
  const large = { width: width * enlargement, height: height * enlargement, levels: enlarged(picture, enlargement) };
  const strip = stripFor(large.width, large.height);
  if (strip === undefined) throw new RangeError('the enlarged picture must have room for the words');
  burn(large, strip, white);
  return { ...large, enlargement, stripHeight: strip.height };
}

/** The lines into which the words fall at this width, or undefined where they do not fit. */
function stripFor(width: number, height: number): Strip | undefined {
  const dot = Math.max(1, Math.floor(width / columnsPerDot));
  const lines = wrapped(Math.floor((width / dot - 2 * margin) / advance));
  if (lines === undefined) return undefined;
  const stripHeight = dot * (lines.length * (letterHeight + margin) + margin);
  return stripHeight <= height * largestShare ? { lines, dot, height: stripHeight } : undefined;
}

function wrapped(longest: number): string[] | undefined {
  const lines: string[] = [];
  for (const word of exportedWords.split(' ')) {
    if (word.length > longest) return undefined;
    const joined = `${lines.at(-1) ?? ''} ${word}`.trim();
    if (lines.length > 0 && joined.length <= longest) lines[lines.length - 1] = joined;
    else lines.push(word);
  }
  return lines;
}

function enlarged<L extends Uint8Array | Uint16Array>({ width, height, levels }: Levels & { readonly levels: L }, times: number): L {
  const length = levels.length * times ** 2;
  const copy = levels.BYTES_PER_ELEMENT === 1 ? new Uint8Array(length) : new Uint16Array(length);
  for (let y = 0; y < height * times; y++) {
    const row = Math.floor(y / times) * width;
    for (let x = 0; x < width * times; x++) copy[y * width * times + x] = levels[row + Math.floor(x / times)] as number;
  }
  return copy as L;
}

function burn(picture: Levels, { lines, dot, height }: Strip, white: number): void {
  const from = picture.height - height;
  picture.levels.fill(0, from * picture.width);
  lines.forEach((text, line) => {
    const left = Math.floor((picture.width - text.length * advance * dot) / 2);
    writeText(picture, { text, left, top: from + dot * (margin + line * (letterHeight + margin)), white, dot });
  });
}
