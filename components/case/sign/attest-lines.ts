/** The lines a physicist may stand by, made from what the case holds; each with what it rests on. Nothing is ticked beforehand. */
import type { Trial } from '@/server/contract/case-parts';
import type { Case } from '@/server/contract/cases';
import { confidenceWords } from '../words';

export interface AttestLine {
  readonly line: string;
  readonly restsOn: string;
}

/** The trial that came nearest to the bad image; undefined where none was compared with one. */
export function nearestTrial(trials: readonly Trial[]): Trial | undefined {
  const compared = trials.filter((trial) => trial.metrics.nrmse !== null);
  return compared.reduce<Trial | undefined>(
    (best, trial) => (best === undefined || (trial.metrics.nrmse ?? Infinity) < (best.metrics.nrmse ?? Infinity) ? trial : best),
    undefined,
  );
}

export function attestLines(found: Case, trials: readonly Trial[], causeTitle: string | null): AttestLine[] {
  const { finding, images } = found;
  const nearest = nearestTrial(trials);
  const verified = images.filter(({ role }) => role === 'verification').length;
  return [
    {
      line: causeTitle === null ? 'The cause was not found.' : `The cause is ${causeTitle.charAt(0).toLowerCase()}${causeTitle.slice(1)}.`,
      restsOn: finding ? confidenceWords[finding.confidence] : 'no finding is written',
    },
    {
      line: 'The fault was reproduced by a trial.',
      restsOn: nearest
        ? `trial ${nearest.number}: NRMSE ${nearest.metrics.nrmse?.toFixed(3)} against the bad image`
        : 'no trial was compared with the bad image',
    },
    { line: 'The fix was shown to work.', restsOn: verified > 0 ? 'an image after the fix is kept' : 'there is no image after the fix' },
    { line: 'Every other cause was excluded.', restsOn: 'yours to judge: nothing here proves it' },
  ];
}

/** What the typed case number still lacks, in words; null when it is this case's number. */
export function numberFault(typed: string, number: number): string | null {
  const digits = typed.trim();
  if (!/^\d*$/.test(digits)) return 'digits only';
  if (digits !== '' && Number(digits) === number) return null;
  const missing = Math.max(4, String(number).length) - digits.length;
  if (missing > 0) return missing === 1 ? 'one more digit' : `${missing} more digits`;
  return 'this is not the number of this case';
}
