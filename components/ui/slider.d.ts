/**
 * A quantity on a ruled thread. The thread between the tick of the starting value and the thumb is indigo; the value can be typed.
 * Drawn by slider.web.tsx: the browser's own range input carries focus, arrow keys and the spoken value.
 */
import type { ReactElement } from 'react';

export interface SliderProps {
  label: string;
  value: number;
  /** The value that it started with: the header's, or the catalogue's. */
  initial: number;
  min: number;
  max: number;
  step: number;
  unit: string;
  onChange: (value: number) => void;
  /** The hand left the control. */
  onLetGo?: () => void;
  /** What the server said about this value. */
  error?: string | undefined;
  /** Where the starting value came from. */
  note?: string | undefined;
  disabled?: boolean;
}

export function Slider(props: SliderProps): ReactElement;
