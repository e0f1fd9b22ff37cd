/**
 * Acquisitions laid on the Cartesian grid of the encoded space, one plane of k-space a coil element. Row is the phase-encode line, column the
 * readout sample; zero frequency lies at floor(n/2) of both, the convention of recon/fourier.ts. Oversampling of the readout is kept, so
 * that samples stay what they were; a place that was not sampled is zero.
 */
import { isOfTheImage, isReversed, type Acquisition, type Vector } from './acquisitions';
import { broken, MrdFault } from './fault';
import type { MrdHeader } from './header';

/** What tells one frame from another; frames are in the order of these, the last one fastest. */
export const counters = ['repetition', 'set', 'phase', 'contrast', 'slice'] as const;
export type Counters = Readonly<Record<(typeof counters)[number], number>>;

export interface KspaceFrame {
  readonly counters: Counters;
  /** [channel, row, column] re, im. */
  readonly samples: Float32Array;
  /** How often each line was acquired. */
  readonly acquired: Uint16Array;
  readonly position: Vector;
  readonly directions: readonly [Vector, Vector];
}

export interface Kspace {
  readonly rows: number;
  readonly columns: number;
  readonly channels: number;
  readonly frames: readonly KspaceFrame[];
  /** Columns from the first to the last one that was sampled, the end not included. */
  readonly sampledColumns: readonly [number, number];
  readonly dwellTimeUs: number;
  /** Acquisitions that are no part of the image. */
  readonly skipped: number;
}

const mostSide = 2048;
/** Values of one file, as in server/dicom/image-frames.ts: 128 MB. */
const mostValues = 1 << 25;

/** Frames of an image of so many coil elements: those of several are shown together first. */
export const framesPerPlane = (channels: number): number => (channels === 1 ? 1 : channels + 1);

/** A receiver of acquisitions, and what it has made of them. */
export function kspaceOf(header: MrdHeader): { take(acquisition: Acquisition): void; finish(): Kspace } {
  const [columns, rows] = header.encoded.matrix;
  refuseOtherKinds(header);
  const frames = new Map<string, KspaceFrame>();
  const seen = { channels: 0, first: columns, last: 0, dwellTimeUs: 0, skipped: 0 };
  return {
    take(acquisition) {
      if (!isOfTheImage(acquisition)) return void seen.skipped++;
      if (acquisition.partition > 0) throw threeDimensional;
      const { channels, line } = acquisition;
      if (seen.channels === 0) Object.assign(seen, { channels, dwellTimeUs: acquisition.dwellTimeUs });
      if (channels === 0 || channels !== seen.channels) throw broken('the number of its coil elements changes');
      const row = Math.floor(rows / 2) + line - header.centreLine;
      if (!(row >= 0 && row < rows)) throw broken('a line of it lies outside the matrix');
      const span = spanOf(acquisition, columns);
      const key = counters.map((counter) => acquisition[counter]).join(' ');
      const frame = frames.get(key) ?? newFrame(acquisition, { rows, columns, nFrames: frames.size });
      frames.set(key, frame);
      addLine(frame, acquisition, { rows, columns, row, span });
      seen.first = Math.min(seen.first, span.column);
      seen.last = Math.max(seen.last, span.column + span.count);
    },
    finish() {
      if (frames.size === 0)
        throw new MrdFault('no-pixels', 'The raw data hold no acquisition of an image: noise, calibration or navigators only.');
      const ordered = [...frames.values()].sort(byCounters);
      ordered.forEach((frame) => average(frame, seen.channels, columns));
      const { channels, dwellTimeUs, skipped } = seen;
      return { rows, columns, channels, frames: ordered, sampledColumns: [seen.first, seen.last], dwellTimeUs, skipped };
    },
  };
}

const threeDimensional = new MrdFault(
  'raw-kind',
  'The raw data are three-dimensional: partitions are not transformed here. Export the images of the scan as DICOM.',
);

function refuseOtherKinds({ encoded: { matrix } }: MrdHeader): void {
  const [columns, rows, partitions] = matrix;
  if (partitions > 1) throw threeDimensional;
  if (rows < 2 || columns < 2) {
    throw new MrdFault('raw-kind', 'The raw data have no phase encoding, as those of spectroscopy: there is no image in them.');
  }
  if (rows > mostSide || columns > mostSide) throw new MrdFault('size', `The raw data have a side of more than ${mostSide} samples.`);
}

interface Span {
  /** The first sample that counts, in the order of rising k, and where it lies. */
  readonly sample: number;
  readonly column: number;
  readonly count: number;
}

/**
 * Where the samples of a readout lie. A reversed one is turned round first. Its centre is then counted from the other end, unless the samples
 * only fit when it is not: files are written in both ways.
 */
function spanOf(acquisition: Acquisition, columns: number): Span {
  const { samples, discardPre, discardPost, centreSample } = acquisition;
  const [before, behind] = isReversed(acquisition) ? [discardPost, discardPre] : [discardPre, discardPost];
  const count = samples - before - behind;
  if (count < 1) throw broken('an acquisition has no samples left');
  const silent = centreSample === 0 && samples === columns;
  const stored = silent ? Math.floor(samples / 2) : centreSample;
  const centres = isReversed(acquisition) && !silent ? [samples - 1 - stored, stored] : [stored];
  for (const centre of centres) {
    const column = Math.floor(columns / 2) + before - centre;
    if (column >= 0 && column + count <= columns) return { sample: before, column, count };
  }
  throw broken('an acquisition is longer than the matrix of its header');
}

interface Placing {
  readonly rows: number;
  readonly columns: number;
  readonly row: number;
  readonly span: Span;
}

function addLine(frame: KspaceFrame, acquisition: Acquisition, { rows, columns, row, span }: Placing): void {
  const { samples, channels, data } = acquisition;
  const isTurned = isReversed(acquisition);
  for (let channel = 0; channel < channels; channel++) {
    const to = 2 * ((channel * rows + row) * columns + span.column);
    for (let i = 0; i < span.count; i++) {
      const sample = span.sample + i;
      const from = 2 * (channel * samples + (isTurned ? samples - 1 - sample : sample));
      frame.samples[to + 2 * i] = (frame.samples[to + 2 * i] as number) + (data[from] as number);
      frame.samples[to + 2 * i + 1] = (frame.samples[to + 2 * i + 1] as number) + (data[from + 1] as number);
    }
  }
  frame.acquired[row] = (frame.acquired[row] as number) + 1;
}

function newFrame(acquisition: Acquisition, { rows, columns, nFrames }: { rows: number; columns: number; nFrames: number }): KspaceFrame {
  const { channels, position, readoutDirection, phaseDirection } = acquisition;
  const ofFrame = 2 * rows * columns * framesPerPlane(channels);
  if ((nFrames + 1) * ofFrame > mostValues) {
    const most = Math.floor(mostValues / ofFrame);
    throw new MrdFault(
      'size',
      `The raw data hold more planes than are read from one file (${most} of this size). Export fewer slices at a time.`,
    );
  }
  const [repetition, set, phase, contrast, slice] = counters.map((counter) => acquisition[counter]) as [
    number,
    number,
    number,
    number,
    number,
  ];
  return {
    counters: { repetition, set, phase, contrast, slice },
    samples: new Float32Array(2 * rows * columns * channels),
    acquired: new Uint16Array(rows),
    position,
    directions: [readoutDirection, phaseDirection],
  };
}

function byCounters(one: KspaceFrame, other: KspaceFrame): number {
  return counters.map((counter) => one.counters[counter] - other.counters[counter]).find((difference) => difference !== 0) ?? 0;
}

/** A line that was acquired several times holds the mean. */
function average({ samples, acquired }: KspaceFrame, channels: number, columns: number): void {
  for (const [row, times] of acquired.entries()) {
    if (times < 2) continue;
    for (let channel = 0; channel < channels; channel++) {
      const from = 2 * (channel * acquired.length + row) * columns;
      for (let i = from; i < from + 2 * columns; i++) samples[i] = (samples[i] as number) / times;
    }
  }
}
