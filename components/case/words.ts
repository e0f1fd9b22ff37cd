/** The words and glyphs of a case: one for every value of the contract, so that a value without a word does not compile. */
import type { Case, CaseState, Finding } from '@/server/contract/cases';
import type { Role } from '@/server/contract/route';
import type { GlyphName } from '@/components/ui/glyph-paths';
import type { TextTone } from '@/components/ui/text';

type Sighting = Case['seen'][number];
type ImageRole = Case['images'][number]['role'];

export const stateWords: Record<CaseState, string> = {
  reported: 'reported',
  'under-investigation': 'under investigation',
  'awaiting-sign-off': 'awaiting sign-off',
  closed: 'closed',
};

export const sightingWords: Record<Sighting, string> = {
  ghosts: 'ghosts',
  'fold-in': 'fold-in',
  lines: 'lines',
  shading: 'shading',
  distortion: 'distortion',
  blur: 'blur',
  noise: 'noise',
  'signal-loss': 'signal loss',
  other: 'something else',
};

export const directionWords: Record<Case['direction'], string> = {
  'phase-encode': 'phase encoding',
  'frequency-encode': 'readout',
  both: 'both',
  none: 'neither',
  unknown: 'not sure',
};

export const frequencyWords: Record<Case['howOften'], string> = {
  once: 'once',
  'on-and-off': 'on and off',
  'every-scan': 'every scan',
  unknown: 'not known',
};

export const costWords: Record<Case['cost'], string> = {
  usable: 'image usable',
  repeated: 'scan repeated',
  abandoned: 'scan abandoned',
  unknown: 'not known',
};

export const imageRoleWords: Record<ImageRole, { word: string; glyph: GlyphName; tone: TextTone }> = {
  bad: { word: 'bad image', glyph: 'bad', tone: 'madder' },
  comparison: { word: 'comparison', glyph: 'comparison', tone: 'orchil' },
  phantom: { word: 'phantom', glyph: 'comparison', tone: 'orchil' },
  'other-slice': { word: 'other slice', glyph: 'comparison', tone: 'orchil' },
  'noise-only': { word: 'noise only', glyph: 'image', tone: 'matInk' },
  'coil-element': { word: 'coil element', glyph: 'image', tone: 'matInk' },
  verification: { word: 'after the fix', glyph: 'verified', tone: 'matInk' },
};

export const confidenceWords: Record<Finding['confidence'], string> = {
  consistent: 'consistent',
  reproduced: 'reproduced',
  removed: 'removed',
  'reproduced-and-removed': 'reproduced and removed',
  'excluded-others': 'excluded others',
  'not-found': 'cause not found',
};

export const roleWords: Record<Role, string> = {
  technologist: 'technologist',
  'lead-technologist': 'lead technologist',
  physicist: 'physicist',
  administrator: 'administrator',
};

/** Four digits, as it is typed into the exam's note. */
export const caseNumber = (number: number): string => String(number).padStart(4, '0');

export const optionsOf = <Value extends string>(words: Record<Value, string>): { value: Value; label: string }[] =>
  (Object.keys(words) as Value[]).map((value) => ({ value, label: words[value] }));
