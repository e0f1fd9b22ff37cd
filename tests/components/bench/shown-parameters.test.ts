/** The bench's form leaves out what a choice makes irrelevant. */
import { shownParameters } from '@/components/bench/shown-parameters';

const quantity = { unit: '', min: 0, max: 1, step: 0.1, initial: 0 };
const options = ['spin-echo', 'gradient-echo'].map((value) => ({ value, label: value }));
const parameters = [
  { id: 'sequence', label: 'Sequence', options, initial: 'spin-echo' },
  { id: 'echoTime', label: 'TE', ...quantity, when: { sequence: ['gradient-echo'] } },
  { id: 'bandwidth', label: 'Bandwidth', ...quantity, when: { sequence: ['spin-echo', 'gradient-echo'] } },
  { id: 'strength', label: 'Strength', ...quantity },
];
const shownAt = (values: Record<string, string>) => shownParameters(parameters, values).map(({ id }) => id);

test('What is not tied to a choice is always shown; what is tied is shown at the values that it names', () => {
  expect(shownAt({ sequence: 'gradient-echo' })).toEqual(['sequence', 'echoTime', 'bandwidth', 'strength']);
  expect(shownAt({ sequence: 'spin-echo' })).toEqual(['sequence', 'bandwidth', 'strength']);
});

test('A choice that the recipe leaves out counts with its initial value', () => {
  expect(shownAt({})).toEqual(['sequence', 'bandwidth', 'strength']);
});
