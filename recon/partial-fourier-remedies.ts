/** What helps against missing lines of k-space, whatever fills them: more of them, or an object phase that varies less. Common practice. */
import type { Remedy } from './cause';

/** The price of more lines, under the words of the cause or method. */
export const moreLines = (change: string): Remedy => ({
  change,
  who: 'technologist',
  price:
    'Longer in proportion, or a longer shortest TE and other contrast in echo-planar scans; SNR rises with the square root of the fraction',
  moves: { time: 'rises', snr: 'rises', contrast: 'changes' },
});

export const smootherPhase: readonly Remedy[] = [
  {
    change: 'Shorten TE, or take a spin echo instead of a gradient echo, so that the phase varies less',
    who: 'technologist',
    price: 'Other contrast; a refocusing pulse raises SAR: check the conditions of an implant',
    moves: { contrast: 'changes', sar: 'changes', implantConditions: 'changes' },
  },
  { change: 'Shim again over the region', who: 'technologist', price: 'Seconds to a minute', moves: { time: 'once' } },
];
