/** What the scan facts and the answers suggest: a title, the region, the protocol, the scanner and its coil. */
import type { ScanFacts } from '@/server/contract/facts';
import type { Scanner } from '@/server/contract/registry';
import { sightingWords } from '../words';
import type { Draft, Suggestion } from './draft';

const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

/** The sequence in plain words, from Scanning Sequence (0018,0020), the echo train and the echo-planar flag. */
export function sequenceWords(facts: ScanFacts): string {
  const codes = (facts.scanningSequence.value ?? '').split('\\');
  if (facts.echoPlanar.value || codes.includes('EP')) return 'echo-planar';
  const inversion = codes.includes('IR') ? 'inversion recovery ' : '';
  if (codes.includes('GR')) return `${inversion}gradient echo`;
  if (codes.includes('SE') || inversion) return `${inversion}${(facts.echoTrainLength.value ?? 1) > 1 ? 'fast ' : ''}spin echo`;
  return '';
}

/** Everything that is known in one line: 'Ghosts and blur, head, echo-planar'. Empty where nothing is. */
export function suggest(draft: Draft, facts: ScanFacts | undefined, scannerName: string | undefined): Suggestion {
  const bodyRegion = facts?.bodyPart.value?.toLowerCase() ?? '';
  const protocol = facts ? sequenceWords(facts) : '';
  const seen = draft.seen.map((sighting) => sightingWords[sighting]).join(' and ');
  const known = [seen, draft.bodyRegion ?? bodyRegion, draft.protocol ?? protocol].filter(Boolean);
  const title = known.length > 0 ? known.join(', ') : scannerName ? `bad image on ${scannerName}` : '';
  return { title: capital(title), bodyRegion, protocol };
}

const same = (left: string, right: string | null): boolean => right !== null && left.toLowerCase() === right.toLowerCase();

/** The one scanner of the department with the model that the header names; undefined where none or several have it. */
export function scannerOf(facts: ScanFacts, scanners: readonly Scanner[]): Scanner | undefined {
  const fitting = scanners.filter((scanner) => same(scanner.model, facts.model.value) || same(scanner.name, facts.model.value));
  return fitting.length === 1 ? fitting[0] : undefined;
}

export const coilOf = (facts: ScanFacts, scanner: Scanner): string | null =>
  scanner.coils.find((coil) => same(coil.name, facts.receiveCoil.value))?.id ?? null;
