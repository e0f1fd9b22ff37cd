/** The prices of remedies: the same words in the table of a wide page and in the list of a phone, and never by colour alone. */
import { screen, within } from '@testing-library/react';
import { RemedyList } from '@/components/cause/remedy-list';
import { RemedyTable } from '@/components/cause/remedy-table';
import { show } from '../stage';

const remedies = [
  {
    change: 'Flow compensation',
    who: 'technologist' as const,
    price: 'Longer shortest TE',
    moves: { contrast: 'changes', nerveStimulation: 'rises', implantConditions: 'changes' } as const,
  },
  { change: 'Balance the receiver', who: 'licensed service' as const, price: 'Scanner out of use', moves: { time: 'once' } as const },
  { change: 'Another filter', who: 'physicist' as const, price: 'Slower', moves: {} },
];

/** jsdom's window is 1024 pixels wide: a tablet, which has the list of a phone. */
test('In the list each remedy names what it moves, and who must do it where that is not the technologist', () => {
  show(<RemedyList name="what I can change now" remedies={remedies} />);
  const [flow, receiver, filter] = screen.getAllByRole('listitem');
  if (!flow || !receiver || !filter) throw new Error('three remedies were given');
  for (const words of ['contrast other', 'nerve stimulation more', 'implant check']) within(flow).getByText(words);
  expect(flow.textContent).not.toMatch(/SNR|technologist/);
  within(receiver).getByText('time once');
  within(receiver).getByText('licensed service');
  within(filter).getByText('scan the same');
});

test('In the table every remedy has a word in every column, under a head that a screen reader reads with it', () => {
  show(<RemedyTable name="what I can change now" remedies={remedies} />);
  const table = screen.getByRole('table', { name: 'what I can change now' });
  expect(
    within(table)
      .getAllByRole('columnheader')
      .map(({ textContent }) => textContent),
  ).toEqual([...['change', 'time', 'SNR', 'contrast', 'SAR', 'nerve stimulation', 'implant']]);
  const [, flow] = within(table).getAllByRole('row');
  if (!flow) throw new Error('a row of the first remedy');
  expect(
    within(flow)
      .getAllByRole('cell')
      .map(({ textContent }) => textContent),
  ).toEqual([...['same', 'same', 'other', 'same', 'more', 'check']]);
});

test('A triangle stands beside each word that may leave an operating mode or the conditions of an implant, and beside no other', () => {
  show(<RemedyTable name="prices" remedies={remedies} />);
  const marked = screen.getAllByRole('cell').filter((cell) => cell.querySelector('svg'));
  expect(marked.map(({ textContent }) => textContent)).toEqual(['more', 'check']);
});
