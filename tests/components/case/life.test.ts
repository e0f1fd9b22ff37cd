import { ageOf, agoOf, dayOf } from '@/components/case/age';
import { numberFault, nearestTrial } from '@/components/case/sign/attest-lines';
import { actionsOf } from '@/components/case/view/case-actions';
import { changedFields, changeOf, contestedFields, type CaseDraft } from '@/components/case/view/edit-conflict';
import type { Trial } from '@/server/contract/case-parts';

const may = (...transitions: string[]) => ({ may: { edit: true, assign: false, writeFinding: false, transitions }, images: [] });

describe('what can be done with a case', () => {
  test('is only what the server allows', () => {
    const { first, others } = actionsOf(may('reopen'));
    expect([first, ...others].map(({ id }) => id)).toEqual(['reopen']);
  });

  test('puts the step that leads furthest on the filled block', () => {
    expect(actionsOf(may('assign', 'return', 'sign-off')).first.label).toBe('sign off');
    expect(actionsOf(may('assign', 'investigate')).first.label).toBe('investigate');
  });

  test('is the bench alone for who may take no step', () => {
    const images = [{ imageId: 'a', role: 'bad' as const, addedAt: '2026-05-21T08:00:00Z' }];
    const { first, others } = actionsOf({ ...may(), images });
    expect([first.id, others]).toEqual(['bench', []]);
  });
});

describe('two people change a case at once', () => {
  const start: CaseDraft = {
    title: 'Ghosts',
    scannerId: 's',
    coilId: '',
    seen: ['ghosts'],
    direction: 'unknown',
    howOften: 'unknown',
    cost: 'unknown',
    bodyRegion: '',
    protocol: '',
    description: '',
    tried: '',
    seenOn: '2026-05-21',
  };
  const typed: CaseDraft = { ...start, title: 'Ghosts on T1', tried: 'again', seenOn: '' };

  test('only what was changed is sent, with null for what was emptied', () => {
    expect(changeOf(start, typed)).toEqual({ title: 'Ghosts on T1', tried: 'again', seenOn: null });
    expect(changedFields(start, { ...start, seen: [...start.seen] })).toEqual([]);
  });

  test('a field that both changed to different words is contested; one that only the other changed is not', () => {
    const newest: CaseDraft = { ...start, title: 'Ghosts, head', protocol: 'T1' };
    expect(contestedFields(start, typed, newest)).toEqual(['title']);
    expect(contestedFields(start, typed, { ...start, title: 'Ghosts on T1' })).toEqual([]);
  });
});

describe('the typed case number', () => {
  test('unlocks the signature only when it is this case’s', () => {
    expect(numberFault('0142', 142)).toBeNull();
    expect(numberFault('142', 142)).toBeNull();
    expect(numberFault('0143', 142)).toBe('this is not the number of this case');
  });

  test('says what is still missing', () => {
    expect(numberFault('', 142)).toBe('4 more digits');
    expect(numberFault('014', 142)).toBe('one more digit');
    expect(numberFault('o142', 142)).toBe('digits only');
  });
});

test('the nearest trial is the one with the smallest residual; one that was not compared does not count', () => {
  const trial = (number: number, nrmse: number | null): Trial => ({
    id: '',
    number,
    note: '',
    imageId: '',
    frame: 0,
    compareWith: null,
    phaseEncode: 'row',
    recipe: { steps: [], reconstruction: { method: 'zero-filled', parameters: {} }, seed: 1 },
    metrics: { nrmse, gain: null, ssim: null, ghostRatio: null, ghostRatioOfBad: null },
    digest: '',
    author: { id: '', name: '', role: 'physicist' },
    createdAt: '',
  });
  expect(nearestTrial([trial(3, null), trial(2, 0.2), trial(1, 0.051)])?.number).toBe(1);
  expect(nearestTrial([trial(3, null)])).toBeUndefined();
});

describe('an age', () => {
  const opened = '2026-05-21T08:00:00Z';
  const after = (minutes: number): string => ageOf(opened, Date.parse(opened) + minutes * 60_000);

  test('is told in the one unit that says it', () => {
    expect([after(0), after(25), after(59), after(60), after(23 * 60 + 59), after(24 * 60)]).toEqual([
      'just now',
      '25 min',
      '59 min',
      '1 h',
      '23 h',
      '1 d',
    ]);
  });

  test('that lies back is some time ago, and what is just now is not', () => {
    expect([0, 12].map((minutes) => agoOf(opened, Date.parse(opened) + minutes * 60_000))).toEqual(['just now', '12 min ago']);
  });

  test('on the trail counts calendar days from the day of opening', () => {
    const local = (day: number, hour: number): string => new Date(2026, 4, day, hour, 15).toISOString();
    expect(dayOf(local(24, 9), local(21, 23))).toBe('day 3, 09:15');
    expect(dayOf(local(21, 23), local(21, 8))).toBe('day 0, 23:15');
  });
});
