/**
 * Which frames of a file make one image: those of one component, in one plane of space, with one pixel size and one phase encoding axis, for an
 * image is acquired in one way. A survey in three planes so gives three images; magnitude and phase in one file give two.
 */
import { componentOf, type StoredComponent } from './component';
import { imageOrientationFact, pixelSpacingFact } from './facts/geometry';
import type { Header } from './header';
import { refuse, type Refused } from './refusal';

export interface ImageFrames {
  readonly component: StoredComponent;
  /** Places in the file, as stored. */
  readonly frames: readonly number[];
}

/** More planes or components than this are no set of images but noise: radial surveys have a dozen (common practice). */
const mostImages = 64;

export function imagesOfFrames(headers: readonly Header[]): readonly ImageFrames[] | Refused {
  const images = new Map<string, { component: StoredComponent; frames: number[] }>();
  for (const [frame, header] of headers.entries()) {
    const component = componentOf(header);
    if (typeof component !== 'string') return component;
    const key = `${component} ${acquisitionKey(header)}`;
    const image = images.get(key);
    if (image === undefined) images.set(key, { component, frames: [frame] });
    else image.frames.push(frame);
  }
  if (images.size <= mostImages) return [...images.values()];
  return refuse('multi-frame', `The frames of the file lie in more than ${mostImages} different planes: they are no images of one scan.`);
}

function acquisitionKey(header: Header): string {
  const cosines = (imageOrientationFact(header).value ?? []).map((cosine) => cosine.toFixed(3));
  const spacing = (pixelSpacingFact(header).value ?? []).map((side) => side.toFixed(3));
  return [...cosines, ...spacing, header.text('phaseEncodingDirection')].join(' ');
}

/** How many frames the header says there are. */
export function frameCount(header: Header): number | Refused {
  const written = header.numbers('numberOfFrames');
  const [frames = 1] = written;
  if (Number.isInteger(frames) && frames >= 1) return frames;
  return refuse('size', 'The header does not say how many frames there are.');
}

/** Values that one file may unfold to: 64 frames of 512², or one of 4096². Reading them takes a quarter of a gigabyte at most, and about a second. */
const mostValues = 1 << 24;

export function refuseTooMany(frames: number, pixels: number): Refused | undefined {
  if (frames * pixels <= mostValues) return undefined;
  const most = Math.floor(mostValues / pixels);
  return refuse('size', `The header claims more frames than are read from one file (${most} of this size). Export the series in parts.`);
}
