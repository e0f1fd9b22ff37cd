/**
 * What was taken out at the door, counted by kind. Group 0010 is the patient module and odd groups are private (DICOM PS3.5
 * section 7.8); the rest are dates, people, places and whatever else is not on the list of technical attributes.
 */
export interface RemovedKinds {
  readonly patient: number;
  readonly privateGroups: number;
  readonly others: number;
}

export function removedKinds(tags: readonly string[]): RemovedKinds {
  const groups = tags.map((tag) => Number.parseInt(tag.slice(0, 4), 16));
  const patient = groups.filter((group) => group === 0x10).length;
  const privateGroups = groups.filter((group) => group % 2 === 1).length;
  return { patient, privateGroups, others: tags.length - patient - privateGroups };
}
