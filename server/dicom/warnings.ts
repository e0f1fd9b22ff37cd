/** What a person should know of an image that was taken. A warning is not a refusal: the image can be worked on with care. */
import type { z } from 'zod';
import type { ScanFacts } from '../contract/facts';
import type { warningSchema } from '../contract/images';
import type { StoredComponent } from './component';
import type { Header } from './header';
import type { Kind } from './kind-of-image';
import type { Pixels } from './pixels';

export type Warning = z.infer<typeof warningSchema>;

/** More exact zeros than this are no noise: the air was blanked. Rician noise rounds to zero in a per cent at most of pixels
 *  where its scale is worth the bits (common practice). */
const blankedFraction = 0.1;

/** Image Type and Scan Options words of images that were filtered, normalised or corrected for distortion. */
const filteredWords = new Set(['NORM', 'FIL', 'DIS2D', 'DIS3D', 'FILTERED_GEMS']);

interface Taken {
  readonly header: Header;
  readonly facts: ScanFacts;
  readonly pixels: Pixels;
  readonly component: StoredComponent;
  readonly kind: Kind;
}

export function warningsOf({ header, facts, pixels, component, kind }: Taken): Warning[] {
  const found = [
    // A picture of a screen is no part of a signal.
    kind.confirmedNoText === null ? componentWarning(component) : undefined,
    ...kind.warnings,
    ...pixels.warnings,
    filtered(header),
    interpolated(facts, pixels),
    component === 'magnitude' ? blanked(pixels) : undefined,
    spacingMissing(facts),
    phaseEncodeUnknown(facts),
    bandwidthDoubtful(facts),
  ];
  return found.filter((warning) => warning !== undefined);
}

const partWords = { phase: 'the phase', real: 'the real part', imaginary: 'the imaginary part' } as const;
const partners = { phase: 'magnitude', real: 'imaginary part', imaginary: 'real part' } as const;

function componentWarning(component: StoredComponent): Warning {
  if (component === 'magnitude') {
    const text = 'This is a magnitude image: its phase is gone. Its k-space is derived from the image and is not the scanner’s raw data.';
    return { code: 'magnitude-only', text };
  }
  const text = `This is ${partWords[component]} of a complex image: alone it can be looked at. With the ${partners[component]} of the same scan it makes a complex image.`;
  return { code: 'one-component', text };
}

function filtered(header: Header): Warning | undefined {
  const words = [...header.texts('imageType'), ...header.texts('scanOptions')].filter((value) => filteredWords.has(value));
  if (words.length === 0) return undefined;
  return {
    code: 'filtered',
    text: `The scanner filtered, normalised or straightened the image (${words.join(', ')}): its k-space shows that too.`,
  };
}

function interpolated({ acquiredReadout, acquiredPhase }: ScanFacts, { rows, columns }: Pixels): Warning | undefined {
  if (acquiredReadout.value === null || acquiredPhase.value === null) return undefined;
  const acquired = [acquiredReadout.value, acquiredPhase.value].sort((a, b) => a - b);
  const stored = [rows, columns].sort((a, b) => a - b);
  if (acquired.every((count, i) => count >= (stored[i] ?? 0))) return undefined;
  const text = `${acquiredReadout.value} × ${acquiredPhase.value} samples were acquired for ${columns} × ${rows} pixels: the image was interpolated, and the edge of its k-space is filled.`;
  return { code: 'interpolated', text };
}

function blanked({ zeroFraction }: Pixels): Warning | undefined {
  if (zeroFraction <= blankedFraction) return undefined;
  const text = `${Math.round(100 * zeroFraction)} % of the pixels are exactly zero: the air was blanked, so noise cannot be measured there.`;
  return { code: 'air-blanked', text };
}

function spacingMissing({ pixelSpacingMm }: ScanFacts): Warning | undefined {
  return pixelSpacingMm.value === null
    ? { code: 'spacing-missing', text: 'The header gives no usable pixel spacing: millimetres are unknown.' }
    : undefined;
}

function phaseEncodeUnknown({ phaseEncode }: ScanFacts): Warning | undefined {
  if (phaseEncode.value !== null) return undefined;
  return {
    code: 'phase-encode-unknown',
    text: 'The phase encoding direction is not known from the header: set it before anything is simulated.',
  };
}

function bandwidthDoubtful({ bandwidthPerPixelHz }: ScanFacts): Warning | undefined {
  if (bandwidthPerPixelHz.origin !== 'doubtful') return undefined;
  return {
    code: 'bandwidth-doubtful',
    text: `The bandwidth per pixel in the header is doubtful. ${bandwidthPerPixelHz.note ?? ''}`.trim(),
  };
}
