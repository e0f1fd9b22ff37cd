/**
 * Partial Fourier: only the lines ky ≥ −(2f−1)·N/2 are taken, round(f·N) of N, so that the band of fraction 2f−1 about the centre is
 * complete on both sides. Along the readout the same: an asymmetric echo, of which the first part is not sampled. What the
 * missing samples cost depends on the reconstruction and on the phase of the object: without one, k-space is Hermitian and nothing
 * is lost.
 */
import { defineCause } from '../cause';
import type { EncodingDirection } from '../lines';
import { keepLines, linesAlong } from '../lines';
import { choice, quantity } from '../parameter';
import { moreLines, smootherPhase } from '../partial-fourier-remedies';

export const partialFourier = defineCause({
  id: 'partial-fourier',
  title: 'Partial Fourier',
  stage: 'encoding',
  domain: 'kspace',
  seen: ['blur', 'lines', 'signal-loss'],
  runsAlong: 'both',
  phantom: 'resolution',
  formula: String.raw`K'(k) = \begin{cases} K(k) & k \ge -(2f - 1)\,N/2 \\ 0 & \text{else} \end{cases}`,
  drivers: [
    { fact: 'Partial Fourier fraction', does: 'is f; the band 2f − 1 about the centre is complete on both sides' },
    { fact: 'Partial Fourier direction', does: 'is the axis of the missing side: lines, or the first part of every echo' },
    { fact: 'TE and sequence', does: 'set how fast the phase of the object varies, and so how much the reconstruction loses' },
  ],
  needsObjectPhase: true,
  parameters: {
    fraction: quantity({
      label: 'Fraction taken',
      unit: 'of N',
      min: 0.625,
      max: 1,
      step: 0.125,
      initial: 0.75,
      fromHeader: {
        fact: 'Partial Fourier fraction',
        read: ({ partialFourierFraction: f }) => (f !== undefined && f < 1 ? f : undefined),
      },
    }),
    direction: choice<EncodingDirection>({
      label: 'Along',
      options: [
        { value: 'phase-encode', label: 'Phase encoding' },
        { value: 'readout', label: 'Readout (asymmetric echo)' },
      ],
      initial: 'phase-encode',
    }),
  },
  identity: { fraction: 1, direction: 'phase-encode' },
  looks: {
    image:
      'Zero-filled, blurred along the direction chosen with ringing at edges; with homodyne sharp again, but dark or bright where the phase of the object changes fast.',
    kspace: 'One side is empty beyond the band 2f−1 about the centre. The k-space of a magnitude image is symmetric and does not show it.',
  },
  sources: [
    {
      citation: 'Noll DC, Nishimura DG, Macovski A. Homodyne detection in magnetic resonance imaging. IEEE Trans Med Imaging 10:154',
      year: 1991,
      doi: '10.1109/42.79473',
      standing: 'confirmed',
    },
    {
      citation:
        'Haacke EM, Lindskog ED, Lin W. A fast, iterative, partial-Fourier technique capable of local phase recovery. J Magn Reson 92:126',
      year: 1991,
      doi: '10.1016/0022-2364(91)90253-P',
      standing: 'confirmed',
    },
    {
      citation: 'McGibney G et al. Quantitative evaluation of several partial Fourier reconstruction algorithms. Magn Reson Med 30:51',
      year: 1993,
      standing: 'confirmed',
    },
  ],
  remedies: [
    moreLines('Raise the fraction: 7/8, or all lines'),
    ...smootherPhase,
    {
      change: 'Try the other reconstruction of the missing side, iterative instead of homodyne, where the console offers it',
      who: 'physicist',
      price: 'Slower reconstruction; the scan itself stays as it is',
      moves: {},
    },
  ],
  apply(kspace, { fraction, direction }, { acquisition }) {
    const lines = linesAlong(kspace, acquisition, direction);
    const nTaken = Math.round(fraction * lines.nLines);
    return keepLines(kspace, lines, (line) => line >= lines.nLines - nTaken);
  },
});
