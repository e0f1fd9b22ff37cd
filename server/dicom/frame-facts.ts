/**
 * What each frame has for itself: place, time of day, delay after the trigger, echo time, and a label of what else tells it from its neighbours.
 * Sources: DICOM PS3.3 C.7.6.16 (functional groups), C.7.6.5 (Cine: Frame Time and Frame Time Vector).
 */
import type { FrameFacts } from '../contract/facts';
import { quantity } from './facts/fact';
import { imagePositionFact } from './facts/geometry';
import { timeOfDayFact } from './facts/time-of-day';
import { echoTimeFact } from './facts/timing';
import type { Header } from './header';

/** A cine loop of a classic file lasts seconds; enhanced ones name delays themselves. */
const delay = { from: 0, to: 600_000, unit: 'ms' };

export function frameFactsOf(headers: readonly Header[], frames: readonly number[]): FrameFacts[] {
  const labels = labelsOf(headers);
  return headers.map((header, i) => ({
    positionMm: imagePositionFact(header).value,
    timeOfDay: timeOfDayFact(header).value,
    triggerDelayMs: triggerDelayOf(header, frames[i] ?? 0),
    echoTimeMs: echoTimeFact(header).value,
    label: labels[i] ?? null,
  }));
}

function triggerDelayOf(header: Header, frame: number): number | null {
  const named = quantity(header, ['triggerDelay', 'triggerTime'], delay).value;
  const elapsed = cineTime(header, frame);
  return elapsed === undefined ? named : (named ?? 0) + elapsed;
}

/** Milliseconds from the first frame to this one, where the file is a cine loop. */
function cineTime(header: Header, frame: number): number | undefined {
  const vector = header.numbers('frameTimeVector');
  const steps = vector.length > frame ? vector.slice(1, frame + 1) : undefined;
  const elapsed = steps?.reduce((sum, step) => sum + step, 0) ?? frame * (header.number('frameTime') ?? NaN);
  return elapsed >= delay.from && elapsed <= delay.to ? elapsed : undefined;
}

/** A label says what changes from frame to frame and is not said elsewhere. */
function labelsOf(headers: readonly Header[]): (string | null)[] {
  const parts = [headers.map(diffusionLabel), headers.map(timePointLabel)].filter((labels) => new Set(labels).size > 1);
  return headers.map((_, i) => {
    const label = parts.map((labels) => labels[i]).filter((part) => part !== undefined);
    return label.length === 0 ? null : label.join(', ');
  });
}

function diffusionLabel(header: Header): string | undefined {
  const { value } = quantity(header, 'diffusionWeighting', { from: 0, to: 100_000, unit: 's/mm²' });
  return value === null ? undefined : `b ${Number(value.toPrecision(4))} s/mm²`;
}

function timePointLabel(header: Header): string | undefined {
  const { value } = quantity(header, 'temporalPosition', { from: 1, to: 100_000, unit: '' });
  return value === null ? undefined : `time point ${value}`;
}
