/** What a person should know of raw data that were taken. */
import type { Warning } from '../dicom/warnings';
import { linesOf } from './facts';
import type { MrdHeader } from './header';
import type { Kspace } from './kspace';

export function warningsOf(header: MrdHeader, kspace: Kspace, exponent: number): Warning[] {
  return [raw(kspace, exponent), undersampled(kspace), oversampled(header), asymmetric(kspace), skipped(kspace)].filter(
    (warning) => warning !== undefined,
  );
}

function raw({ channels }: Kspace, exponent: number): Warning {
  const whose =
    channels === 1
      ? 'Its k-space is what the scanner sampled.'
      : `The k-space of each of its ${channels} coil elements is what the scanner sampled; the first frame of a plane is all of them added, weighted by their sensitivities.`;
  return {
    code: 'raw',
    text: `These are raw data, not filtered or corrected by the scanner. ${whose} All samples were multiplied by 2^${exponent}.`,
  };
}

function undersampled({ frames, rows }: Kspace): Warning | undefined {
  const lines = frames.map(linesOf);
  const fewest = Math.min(...lines);
  if (fewest === rows) return undefined;
  const text = `${fewest} of ${rows} lines were acquired: the others are zero, and the picture is undersampled. Nothing was filled in.`;
  return { code: 'undersampled', text };
}

function oversampled({ encoded, reconstructed }: MrdHeader): Warning | undefined {
  const factor = encoded.fieldOfViewMm[0] / reconstructed.fieldOfViewMm[0];
  if (!(factor > 1.05)) return undefined;
  const text = `The readout is oversampled: the picture shows all ${Math.round(encoded.fieldOfViewMm[0])} mm that were encoded, of which a scanner keeps the middle ${Math.round(reconstructed.fieldOfViewMm[0])} mm.`;
  return { code: 'oversampled', text };
}

function asymmetric({ columns, sampledColumns: [from, to] }: Kspace): Warning | undefined {
  if (to - from === columns) return undefined;
  return { code: 'asymmetric-echo', text: `A readout has ${to - from} of ${columns} samples: the others are zero.` };
}

function skipped({ skipped: n }: Kspace): Warning | undefined {
  if (n === 0) return undefined;
  return { code: 'not-of-the-image', text: `${n} acquisition${n === 1 ? '' : 's'} of noise, calibration or correction were left out.` };
}
