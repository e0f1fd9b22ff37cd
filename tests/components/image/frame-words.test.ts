/** How frames are called, and which of two images go together. */
import { frameWords, partnerFrame } from '@/components/image/frame-words';

const facts = { positionMm: null, timeOfDay: null, triggerDelayMs: null, echoTimeMs: null, label: null };

test('a frame is called by its number, counted from 1', () => {
  expect(frameWords({ frames: 16, frameFacts: Array(16).fill(facts) }, 4)).toBe('frame 5 of 16');
});

test('and by what tells it from its neighbours: a label, a delay, an echo', () => {
  const frameFacts = [
    { ...facts, label: 'b 0 s/mm²', echoTimeMs: 5 },
    { ...facts, label: 'b 1000 s/mm²', triggerDelayMs: 69.47, echoTimeMs: 10 },
  ];
  expect(frameWords({ frames: 2, frameFacts }, 1)).toBe('frame 2 of 2, b 1000 s/mm², 69.5 ms after the trigger, echo at 10 ms');
});

test('an echo time that is the same for all frames is not worth a word', () => {
  expect(
    frameWords(
      {
        frames: 2,
        frameFacts: [
          { ...facts, echoTimeMs: 5 },
          { ...facts, echoTimeMs: 5 },
        ],
      },
      0,
    ),
  ).toBe('frame 1 of 2');
});

test('frames of images with as many of each go together; else the second keeps its own', () => {
  expect(partnerFrame(7, { id: 'a', frames: 16 }, { id: 'b', frames: 16 }, 2)).toBe(7);
  expect(partnerFrame(7, { id: 'a', frames: 16 }, { id: 'a', frames: 16 }, 2)).toBe(7);
  expect(partnerFrame(7, { id: 'a', frames: 16 }, { id: 'b', frames: 1 }, 0)).toBe(0);
});
