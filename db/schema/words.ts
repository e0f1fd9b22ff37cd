/**
 * The closed vocabularies of the database, as PostgreSQL enumerations: a value outside the list cannot be stored. The contract
 * holds the same words; a service that passes one to the other does not compile when they part.
 */
import { pgEnum } from 'drizzle-orm/pg-core';

export const roleWord = pgEnum('role', ['technologist', 'lead-technologist', 'physicist', 'administrator']);
export const componentWord = pgEnum('component', ['magnitude', 'phase', 'real', 'imaginary', 'complex']);
export const imageUseWord = pgEnum('image_use', ['measured', 'look-only']);
export const kspaceOriginWord = pgEnum('kspace_origin', ['derived', 'raw']);
/** The door that an image came through. */
export const arrivalWord = pgEnum('arrival', ['upload', 'scanner', 'web-push', 'made-here']);
export const phaseEncodeWord = pgEnum('phase_encode', ['row', 'column']);
export const domainWord = pgEnum('domain', ['image', 'kspace']);

export const caseStateWord = pgEnum('case_state', ['reported', 'under-investigation', 'awaiting-sign-off', 'closed']);
export const sightingWord = pgEnum('sighting', [
  'ghosts',
  'fold-in',
  'lines',
  'shading',
  'distortion',
  'blur',
  'noise',
  'signal-loss',
  'other',
]);
export const directionWord = pgEnum('direction', ['phase-encode', 'frequency-encode', 'both', 'none', 'unknown']);
export const frequencyWord = pgEnum('frequency', ['once', 'on-and-off', 'every-scan', 'unknown']);
export const imageCostWord = pgEnum('image_cost', ['usable', 'repeated', 'abandoned', 'unknown']);
export const imageRoleWord = pgEnum('image_role', [
  'bad',
  'comparison',
  'phantom',
  'other-slice',
  'noise-only',
  'coil-element',
  'verification',
]);
export const confidenceWord = pgEnum('confidence', [
  'consistent',
  'reproduced',
  'removed',
  'reproduced-and-removed',
  'excluded-others',
  'not-found',
]);
export const markKindWord = pgEnum('mark_kind', ['arrow', 'ellipse', 'rectangle', 'polyline', 'text', 'ruler', 'profile']);
export const eventKindWord = pgEnum('event_kind', [
  'filed',
  'changed',
  'image-added',
  'fact-set',
  'trial-kept',
  'mark-added',
  'mark-removed',
  'commented',
  'finding-written',
  'assigned',
  'state-changed',
  'signed',
]);
