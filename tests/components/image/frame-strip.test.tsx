/** The strip of frames: a picture each, one of them chosen, by hand and by keys. */
import { fireEvent, screen } from '@testing-library/react';
import { useState } from 'react';
import { FrameStrip } from '@/components/image/frame-strip';
import { show } from '../stage';

const facts = { positionMm: null, timeOfDay: null, triggerDelayMs: null, echoTimeMs: null, label: null };
const image = { id: '1c0a4cb1-62f2-4b0e-8d5f-8a6f6b0f1111', frames: 4, frameFacts: Array(4).fill(facts) };

function Strip({ told }: { told: (frame: number) => void }) {
  const [frame, setFrame] = useState(1);
  return (
    <FrameStrip
      image={image}
      of="bad image"
      value={frame}
      onChange={(next) => {
        setFrame(next);
        told(next);
      }}
    />
  );
}

const radios = () => screen.getAllByRole('radio');
const chosen = () => radios().findIndex((radio) => radio.getAttribute('aria-checked') === 'true');

test('every frame is a picture with a name, and the chosen one is in the tab order', () => {
  show(<Strip told={() => undefined} />);
  expect(radios().map((radio) => radio.getAttribute('aria-label'))).toEqual([1, 2, 3, 4].map((n) => `frame ${n} of 4`));
  expect(radios().map((radio) => radio.getAttribute('tabindex'))).toEqual(['-1', '0', '-1', '-1']);
  const sources = [...document.querySelectorAll('img')].map((picture) => picture.getAttribute('src'));
  expect(sources).toEqual([0, 1, 2, 3].map((frame) => `/api/images/${image.id}/thumbnail${frame === 0 ? '' : `?frame=${frame}`}`));
  expect(screen.getByText('bad image: frame 2 of 4')).toBeTruthy();
});

test('a press chooses, arrows move the choice and stop at the ends', () => {
  const told = jest.fn();
  show(<Strip told={told} />);
  fireEvent.click(radios()[3] as HTMLElement);
  expect(chosen()).toBe(3);
  fireEvent.keyDown(radios()[3] as HTMLElement, { key: 'ArrowRight' });
  expect(chosen()).toBe(3);
  fireEvent.keyDown(radios()[3] as HTMLElement, { key: 'ArrowLeft' });
  expect(document.activeElement?.getAttribute('aria-label')).toBe('frame 3 of 4');
  fireEvent.keyDown(radios()[2] as HTMLElement, { key: 'Home' });
  expect(chosen()).toBe(0);
  expect(told.mock.calls.map(([frame]) => frame)).toEqual([3, 3, 2, 0]);
});
