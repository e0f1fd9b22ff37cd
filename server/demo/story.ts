/**
 * A demo case as a record: what was reported with which pictures, and what happened to it afterwards, in order. It is told through the
 * same services as anyone's case, so that rights, states, numbers and digests are those of the product.
 */
import type { z } from 'zod';
import type { addMark } from '../contract/case-parts';
import type { createCase, Finding } from '../contract/cases';
import type { Role } from '../contract/route';
import type { Dependencies } from '../dependencies';
import { comment, markImage, writeFinding } from '../services/case-notes';
import { attachToCase, fileCase } from '../services/change-case';
import { moveCase } from '../services/move-case';
import type { Caller } from '../services/sessions';
import { keepTrial } from '../services/trials';
import { storeImages } from '../services/upload-images';
import { demoPicture, faultSeed, type DemoPicture, type Fault } from './pictures';
import type { Protocol } from './protocols';

type Report = z.output<typeof createCase.body>;
type Mark = Pick<z.output<typeof addMark.body>, 'kind' | 'points' | 'text'> & { readonly domain?: 'image' | 'kspace' };

export interface Shown {
  readonly role: Report['images'][number]['role'];
  readonly picture: DemoPicture;
}

/** Pictures are named by their place: 0 is the first of `shown`, and so on; attached ones follow. */
export type Happening =
  | { readonly by: Role; readonly note: string }
  | { readonly by: Role; readonly on: number; readonly mark: Mark }
  | { readonly by: Role; readonly on: number; readonly against?: number; readonly trial: Fault; readonly note: string }
  | { readonly by: Role; readonly assignTo: Role }
  | { readonly by: Role; readonly attach: Shown }
  | { readonly by: Role; readonly finding: Finding }
  | { readonly by: Role; readonly step: 'ask-for-sign-off' }
  | { readonly by: Role; readonly returned: string }
  /** Lines that are stood by, and lines that are left open. */
  | { readonly by: Role; readonly signed: { readonly stands: readonly string[]; readonly open: readonly string[] } };

export interface Story extends Pick<Report, 'title' | 'seen' | 'direction' | 'howOften' | 'cost' | 'description' | 'tried'> {
  readonly protocol: Protocol;
  readonly seenDaysAgo: number;
  readonly shown: readonly Shown[];
  readonly then: readonly Happening[];
}

/** Whom the demo department has, and what its scanners are known by. */
export interface Cast {
  as(role: Role): Caller;
  placeOf(protocol: Protocol): { readonly scannerId: string; readonly coilId: string };
}

/** Files the case and lets everything happen to it. */
export async function tell(deps: Dependencies, cast: Cast, story: Story): Promise<void> {
  const { protocol, seenDaysAgo, shown, then, ...report } = story;
  const reporter = cast.as('technologist');
  const imageIds = await stored(deps, reporter, shown);
  const filed = await fileCase(deps.db, reporter, {
    ...report,
    ...cast.placeOf(protocol),
    bodyRegion: protocol.bodyRegion,
    protocol: protocol.name,
    seenOn: daysAgo(seenDaysAgo),
    images: shown.map(({ role }, i) => ({ role, imageId: imageIds[i] as string })),
  });
  const told: Told = { deps, cast, caseId: filed.id, number: filed.number, imageIds };
  for (const happening of then) await happen(told, happening);
}

interface Told {
  readonly deps: Dependencies;
  readonly cast: Cast;
  readonly caseId: string;
  readonly number: number;
  /** Grows when a picture is attached. */
  readonly imageIds: string[];
  finding?: Finding;
}

async function happen(told: Told, happening: Happening): Promise<void> {
  const { deps, cast, caseId, imageIds } = told;
  const caller = cast.as(happening.by);
  if ('trial' in happening) return keepDemoTrial(told, caller, happening);
  if ('mark' in happening) {
    await markImage(deps.db, caller, caseId, { domain: 'image', frame: 0, imageId: imageAt(told, happening.on), ...happening.mark });
  } else if ('note' in happening) {
    await comment(deps.db, caller, caseId, { text: happening.note });
  } else if ('attach' in happening) {
    const [imageId] = await stored(deps, caller, [happening.attach]);
    if (imageId === undefined) throw new Error('the picture of a demo case was not stored');
    imageIds.push(imageId);
    await attachToCase(deps.db, caller, caseId, { imageId, role: happening.attach.role });
  } else if ('finding' in happening) {
    told.finding = happening.finding;
    await writeFinding(deps.db, caller, caseId, happening.finding);
  } else {
    await moveCase(deps.db, caller, caseId, transitionOf(told, happening));
  }
}

type Step = Extract<Happening, { assignTo: Role } | { step: string } | { returned: string } | { signed: unknown }>;

function transitionOf({ cast, number, finding }: Told, step: Step): Parameters<typeof moveCase>[3] {
  if ('assignTo' in step) return { action: 'assign', memberId: cast.as(step.assignTo).memberId };
  if ('step' in step) return { action: step.step };
  if ('returned' in step) return { action: 'return', reason: step.returned };
  if (finding === undefined) throw new Error('a demo case is signed without a finding');
  const { stands, open } = step.signed;
  const attested = [...stands.map((line) => ({ line, stands: true })), ...open.map((line) => ({ line, stands: false }))];
  return { action: 'sign-off', caseNumber: number, confidence: finding.confidence, lesson: finding.lesson, attested };
}

async function keepDemoTrial(
  told: Told,
  caller: Caller,
  { on, against, trial, note }: Extract<Happening, { trial: Fault }>,
): Promise<void> {
  const steps = trial.steps.map((step) => ({ ...step, parameters: { ...step.parameters } }));
  const recipe = { ...trial, steps, reconstruction: { method: 'zero-filled', parameters: {} }, seed: faultSeed };
  const compareWith = against === undefined ? null : { imageId: imageAt(told, against), frame: 0 };
  const wish = { caseId: told.caseId, imageId: imageAt(told, on), frame: 0, compareWith, note, recipe };
  await keepTrial(told.deps, caller, wish, new AbortController().signal);
}

function imageAt({ imageIds }: Told, place: number): string {
  const id = imageIds[place];
  if (id === undefined) throw new Error(`a demo case has no picture ${place}`);
  return id;
}

async function stored(deps: Dependencies, caller: Caller, shown: readonly Shown[]): Promise<string[]> {
  const images = await storeImages(
    deps,
    caller,
    shown.map(({ picture }) => demoPicture(picture)),
  );
  return images.map(({ id }) => id);
}

const daysAgo = (days: number): string => new Date(Date.now() - days * 86_400_000).toISOString().slice(0, 10);
