/** What a person should know of the pixels of an image that was taken, over all its frames. */
import type { StoredComponent } from './component';
import type { Warning } from './warnings';

/** What was counted while the pixels were read. */
export interface Found {
  padded: number;
  negative: number;
  zeros: number;
  /** Frames whose rescale was left out. */
  ignoredRescales: number;
  inverted: boolean;
  unknownUnit: boolean;
}

export const unknownUnitCode = 'phase-unit-unknown';

export function pixelWarnings({ padded, negative, ignoredRescales, inverted, unknownUnit }: Found, component: StoredComponent): Warning[] {
  const found: (Warning | false)[] = [
    ignoredRescales > 0 && {
      code: 'rescale-ignored',
      text: 'The rescale slope and intercept in the header make no sense and were left out: values are as stored.',
    },
    inverted && {
      code: 'inverted',
      text: 'The image is stored inverted (MONOCHROME1) and was turned about its largest stored value: where its signal is zero is not known for sure.',
    },
    unknownUnit && {
      code: unknownUnitCode,
      text: 'The header does not say what the phase counts in: values are as stored, not radians, and make no complex image.',
    },
    padded > 0 && {
      code: 'padding',
      text: `${padded} pixels held the padding value, which marks places without an image; they were set to zero.`,
    },
    component === 'magnitude' &&
      negative > 0 && {
        code: 'negative-values',
        text: `${negative} pixels are negative, which a magnitude cannot be: a filter, an interpolation or a subtraction made them.`,
      },
  ];
  return found.filter((warning) => warning !== false);
}
