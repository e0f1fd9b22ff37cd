/** A cause for tests: what a test does not care about is empty. */
import type { Cause } from '@/server/contract/catalogue';

export const causeWith = (part: Partial<Cause> & { id: string }): Cause => ({
  title: part.id,
  stage: 'encoding',
  seen: [],
  runsAlong: 'none',
  formula: '',
  drivers: [],
  parameters: [],
  looks: { image: '', kspace: '' },
  needsObjectPhase: false,
  phantom: { title: 'Head', fieldOfViewMm: 240 },
  strength: [],
  remedies: [],
  sources: [],
  ...part,
});
