import { emptyDraft } from '@/components/case/new/draft';
import { scannerOf, sequenceWords, suggest } from '@/components/case/new/suggest';
import { scanFactsSchema, type ScanFacts } from '@/server/contract/facts';
import type { Scanner } from '@/server/contract/registry';

const names = Object.keys(scanFactsSchema.shape) as (keyof ScanFacts)[];
const silent = scanFactsSchema.parse(Object.fromEntries(names.map((name) => [name, { value: null, origin: 'absent' }])));
const header = <T>(value: T) => ({ value, origin: 'header' as const });

const scanner = (id: string, model: string): Scanner => ({
  id,
  name: model,
  manufacturer: '',
  model,
  fieldStrengthTesla: 3,
  serial: '',
  softwareVersion: '',
  room: '',
  coils: [],
  openCases: 0,
});

// Scanning Sequence (0018,0020): SE, IR, GR, EP, RM (DICOM PS3.3 C.8.3.1.1); a spin echo with an echo train is a fast one (common practice).
test('the sequence is said in plain words', () => {
  expect(sequenceWords({ ...silent, scanningSequence: header('SE') })).toBe('spin echo');
  expect(sequenceWords({ ...silent, scanningSequence: header('SE'), echoTrainLength: header(8) })).toBe('fast spin echo');
  expect(sequenceWords({ ...silent, scanningSequence: header('SE\\IR') })).toBe('inversion recovery spin echo');
  expect(sequenceWords({ ...silent, scanningSequence: header('GR') })).toBe('gradient echo');
  expect(sequenceWords({ ...silent, scanningSequence: header('EP\\SE') })).toBe('echo-planar');
  expect(sequenceWords(silent)).toBe('');
});

test('a title is made of what is known, and is empty where nothing is', () => {
  const facts = { ...silent, bodyPart: header('HEAD'), scanningSequence: header('SE') };
  expect(suggest({ ...emptyDraft, seen: ['ghosts', 'blur'] }, facts, undefined).title).toBe('Ghosts and blur, head, spin echo');
  expect(suggest(emptyDraft, undefined, 'Tern 3 T').title).toBe('Bad image on Tern 3 T');
  expect(suggest(emptyDraft, undefined, undefined).title).toBe('');
});

test('the header names a scanner only where exactly one of the department has that model', () => {
  const facts = { ...silent, model: header('Tern') };
  expect(scannerOf(facts, [scanner('a', 'Tern'), scanner('b', 'Heron')])?.id).toBe('a');
  expect(scannerOf(facts, [scanner('a', 'Tern'), scanner('b', 'Tern')])).toBeUndefined();
  expect(scannerOf(silent, [scanner('a', 'Tern')])).toBeUndefined();
});
