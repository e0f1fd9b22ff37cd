/** The stages of the signal chain, in order: where in the making of an image a cause acts. */
import type { CatalogueEntry, Stage } from '@/server/contract/catalogue';

export const stageWords: Record<Stage, string> = {
  object: 'object',
  encoding: 'encoding',
  receive: 'receive',
  reconstruction: 'reconstruction',
};

/** What a stage is about, in a line. */
export const stageMeanings: Record<Stage, string> = {
  object: 'what moved or sat wrong',
  encoding: 'where the lines were laid',
  receive: 'what was heard',
  reconstruction: 'how it was put together',
};

/** The stages that have a cause, each with its causes in the order of the catalogue. */
export const causesByStage = (causes: readonly CatalogueEntry[]): { stage: Stage; causes: CatalogueEntry[] }[] =>
  (Object.keys(stageWords) as Stage[])
    .map((stage) => ({ stage, causes: causes.filter((cause) => cause.stage === stage) }))
    .filter(({ causes: ofStage }) => ofStage.length > 0);
