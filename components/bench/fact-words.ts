/** The scan facts that the bench shows, in the words of the trade, with their units and where each came from. */
import { fixed, significant } from '@/components/ui/number-text';
import type { FactName, ScanFacts } from '@/server/contract/facts';

type Fact = ScanFacts[FactName];

interface FactWords {
  readonly label: string;
  readonly unit?: string;
}

/** In the order in which they are asked for at the console. */
export const benchFacts = {
  repetitionTimeMs: { label: 'TR', unit: 'ms' },
  averages: { label: 'averages' },
  echoTimeMs: { label: 'TE', unit: 'ms' },
  inversionTimeMs: { label: 'TI', unit: 'ms' },
  flipAngleDegrees: { label: 'flip angle', unit: '°' },
  echoTrainLength: { label: 'echo train' },
  bandwidthPerPixelHz: { label: 'bandwidth per pixel', unit: 'Hz' },
  acquiredPhase: { label: 'lines acquired' },
  acquiredReadout: { label: 'samples acquired' },
  percentPhaseFieldOfView: { label: 'phase field of view', unit: '%' },
  partialFourier: { label: 'partial Fourier' },
  accelerationFactor: { label: 'acceleration' },
  pixelSpacingMm: { label: 'pixel', unit: 'mm' },
  sliceThicknessMm: { label: 'slice', unit: 'mm' },
  fieldStrengthTesla: { label: 'field', unit: 'T' },
} as const satisfies Partial<Record<FactName, FactWords>>;
export type BenchFact = keyof typeof benchFacts;

export function factText(value: Fact['value']): string {
  if (value === null) return '–';
  if (typeof value === 'number') return Number.isInteger(value) ? fixed(value, 0) : significant(value, 4);
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (Array.isArray(value)) return value.map((each) => significant(each, 3)).join(' × ');
  return value;
}

/** Where a fact came from. What simply stands in the header needs no words of its own. */
export function originWords({ origin, note, headerValue }: Fact): string | undefined {
  switch (origin) {
    case 'header':
    case 'absent':
      return undefined;
    case 'worked-out':
      return note ? `worked out: ${note}` : 'worked out';
    case 'doubtful':
      return note ? `doubtful: ${note}` : 'doubtful';
    case 'member':
      return headerValue === null || headerValue === undefined
        ? 'set by hand; the header is silent'
        : `set by hand; the header says ${factText(headerValue)}`;
  }
}
