/** How a frame is called, and which frame of a second image goes with it. */
import type { Image } from '@/server/contract/images';

type Framed = Pick<Image, 'frames' | 'frameFacts'>;

const rounded = (value: number): string => String(Number(value.toFixed(1)));

/** `frame 5 of 16`, and what tells it from its neighbours where the header says so. */
export function frameWords({ frames, frameFacts }: Framed, frame: number): string {
  const facts = frameFacts[frame];
  const echoes = new Set(frameFacts.map(({ echoTimeMs }) => echoTimeMs));
  const more = [
    facts?.label ?? null,
    facts === undefined || facts.triggerDelayMs === null ? null : `${rounded(facts.triggerDelayMs)} ms after the trigger`,
    facts === undefined || facts.echoTimeMs === null || echoes.size < 2 ? null : `echo at ${rounded(facts.echoTimeMs)} ms`,
  ].filter((words) => words !== null);
  return [`frame ${frame + 1} of ${frames}`, ...more].join(', ');
}

/** Frames of images with as many of each go together; otherwise the second image keeps its own. */
export const partnerFrame = (
  chosen: number,
  one: Pick<Image, 'id' | 'frames'>,
  other: Pick<Image, 'id' | 'frames'>,
  its: number,
): number => (one.id === other.id || one.frames === other.frames ? chosen : its);
