/** The stages of the signal chain, in order: where in the making of an image a cause acts. */
import type { Cause, Stage } from '@/server/contract/catalogue';

export const stageWords: Record<Stage, string> = {
  object: 'object',
  encoding: 'encoding',
  receive: 'receive',
  reconstruction: 'reconstruction',
};

export const causesByStage = (causes: readonly Cause[]): { stage: Stage; causes: Cause[] }[] =>
  (Object.keys(stageWords) as Stage[]).map((stage) => ({ stage, causes: causes.filter((cause) => cause.stage === stage) }));
