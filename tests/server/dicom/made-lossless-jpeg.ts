/** A writer of lossless JPEG for these tests, with every predictor, restarts and a point transform. Source: ITU-T T.81 annexes B, C, H. */

export interface LosslessJpeg {
  readonly columns: number;
  readonly precision: number;
  /** Table H.1; 1 where left out. */
  readonly selection?: number;
  readonly pointTransform?: number;
  readonly rowsOfInterval?: number;
  /** Of the frame header, where it is to lie. */
  readonly rows?: number;
}

const predictors: readonly ((a: number, b: number, c: number) => number)[] = [
  (a) => a,
  (_, b) => b,
  (_, __, c) => c,
  (a, b, c) => a + b - c,
  (a, b, c) => a + Math.floor((b - c) / 2),
  (a, b, c) => b + Math.floor((a - c) / 2),
  (a, b) => Math.floor((a + b) / 2),
];

/** Every category has a code of five bits: its own number. */
const nCategories = 17;
const codeLength = 5;

export function losslessJpeg(pixels: ArrayLike<number>, options: LosslessJpeg): Uint8Array {
  const { columns, precision, selection = 1, pointTransform = 0 } = options;
  const rows = pixels.length / columns;
  const rowsOfInterval = options.rowsOfInterval ?? rows;
  const segment = (marker: number, ...body: number[]) => [0xff, marker, ...two(body.length + 2), ...body];
  const head = [
    ...[0xff, 0xd8],
    ...segment(0xc4, 0, ...Array.from({ length: 16 }, (_, i) => (i + 1 === codeLength ? nCategories : 0)), ...Array(nCategories).keys()),
    ...segment(0xc3, precision, ...two(options.rows ?? rows), ...two(columns), 1, 1, 0x11, 0),
    ...(rowsOfInterval < rows ? segment(0xdd, ...two(rowsOfInterval * columns)) : []),
    ...segment(0xda, 1, 1, 0, selection, 0, pointTransform),
  ];
  const shifted = Array.from(pixels, (value) => (value & 0xffff) >> pointTransform);
  const bands: number[] = [];
  for (let row = 0; row < rows; row += rowsOfInterval) {
    if (row > 0) bands.push(0xff, 0xd0 + ((row / rowsOfInterval - 1) % 8));
    bands.push(...band(shifted.slice(row * columns, (row + rowsOfInterval) * columns), options, selection));
  }
  return Uint8Array.from([...head, ...bands, 0xff, 0xd9]);
}

const two = (value: number): number[] => [value >> 8, value & 0xff];

/** One interval between restarts. */
function band(samples: readonly number[], { columns, precision, pointTransform = 0 }: LosslessJpeg, selection: number): number[] {
  const at = (index: number) => samples[index] ?? 0;
  const predict = predictors[selection - 1] ?? predictors[0];
  let bits = '';
  samples.forEach((sample, index) => {
    const column = index % columns;
    const inFirstRow = column === 0 ? 2 ** (precision - pointTransform - 1) : at(index - 1);
    const inOthers = column === 0 ? at(index - columns) : predict?.(at(index - 1), at(index - columns), at(index - columns - 1));
    bits += codeOf(sample - ((index < columns ? inFirstRow : inOthers) ?? 0));
  });
  bits += '1'.repeat((8 - (bits.length % 8)) % 8);
  const bytes = Array.from({ length: bits.length / 8 }, (_, i) => parseInt(bits.slice(8 * i, 8 * i + 8), 2));
  return bytes.flatMap((byte) => (byte === 0xff ? [0xff, 0] : [byte]));
}

/** The category and the bits of a difference modulo 2¹⁶, taken between −32767 and 32768 (table H.2). */
function codeOf(difference: number): string {
  const wrapped = ((difference + 32767) & 0xffff) - 32767;
  const category = wrapped === 0 ? 0 : Math.floor(Math.log2(Math.abs(wrapped))) + 1;
  const code = category.toString(2).padStart(codeLength, '0');
  if (category === 0 || category === 16) return code;
  return code + (wrapped > 0 ? wrapped : wrapped + 2 ** category - 1).toString(2).padStart(category, '0');
}
