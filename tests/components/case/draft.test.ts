import { emptyDraft, forgetDraft, keepDraft, newCaseFrom, readDraft, type Draft } from '@/components/case/new/draft';
import { removedKinds } from '@/components/case/new/removed-kinds';

const image = '3f0c9a52-6d0b-4c57-9a2e-0b8f3f1d2c11';
const draft: Draft = { ...emptyDraft, images: [image], seen: ['ghosts'], tried: 'scanned again' };
const suggestion = { title: 'Ghosts, head', bodyRegion: 'head', protocol: 'spin echo' };

describe('a draft', () => {
  afterEach(() => window.localStorage.clear());

  test('survives a lost connection, each member’s own', () => {
    keepDraft(window.localStorage, 'ines', draft, 1000);
    expect(readDraft(window.localStorage, 'ines')).toEqual({ keptAt: 1000, draft });
    expect(readDraft(window.localStorage, 'tobias')).toBeNull();
  });

  test('is gone once the case is filed', () => {
    keepDraft(window.localStorage, 'ines', draft, 1000);
    forgetDraft(window.localStorage, 'ines');
    expect(readDraft(window.localStorage, 'ines')).toBeNull();
  });

  test('that cannot be read is no draft, and breaks nothing', () => {
    for (const text of ['{', '{"keptAt":1}', JSON.stringify({ keptAt: 1, draft: { ...draft, images: ['../../etc'] } })]) {
      window.localStorage.setItem('pickglass.draft.ines', text);
      expect(readDraft(window.localStorage, 'ines')).toBeNull();
    }
  });

  test('becomes a case with the suggested title, unless one was typed; images come in as bad ones', () => {
    expect(newCaseFrom(draft, suggestion)).toMatchObject({
      title: 'Ghosts, head',
      bodyRegion: 'head',
      images: [{ imageId: image, role: 'bad' }],
    });
    expect(newCaseFrom({ ...draft, title: ' Copies of the skull ', bodyRegion: '' }, suggestion)).toMatchObject({
      title: 'Copies of the skull',
      bodyRegion: '',
    });
  });
});

// DICOM PS3.5 section 7.8: private elements have an odd group number. PS3.6: group 0010 is about the patient.
test('what was taken out at the door is counted by kind', () => {
  expect(removedKinds(['0010,0010', '0010,0020', '0009,1001', '0008,0080', '0008,0020'])).toEqual({
    patient: 2,
    privateGroups: 1,
    others: 2,
  });
});
