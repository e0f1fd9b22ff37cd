/**
 * The slices of a series side by side in the order of space, to look along and to choose from. The strip scrolls by itself, never the page; a
 * picture is fetched when it comes near. One slice takes part in the tab order, the arrow keys go along the others.
 */
import { useEffect, useRef, useState, type KeyboardEvent } from 'react';
import { frameThumbnailOf } from '@/components/api/frames';
import { Picture } from '@/components/ui/picture';
import { Press } from '@/components/ui/press';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { Slice } from '@/server/contract/series';

interface SliceStripProps {
  label: string;
  slices: readonly Slice[];
  chosen: (slice: Slice) => boolean;
  onPress: (slice: Slice) => void;
  /** Several may be chosen, or one is looked at. */
  many: boolean;
  size?: number;
  /** Of the numbers under the pictures: the mat has words of its own. */
  tone?: 'inkFaint' | 'matInkSoft';
}

export const sliceKey = ({ imageId, frame }: Slice): string => `${imageId} ${frame}`;

const steps: Readonly<Record<string, number>> = { ArrowRight: 1, ArrowLeft: -1, PageDown: 10, PageUp: -10, Home: -Infinity, End: Infinity };

export function SliceStrip({ label, slices, chosen, onPress, many, size = 72, tone = 'inkFaint' }: SliceStripProps) {
  const { colours } = useTheme();
  const strip = useRef<HTMLDivElement>(null);
  const firstChosen = Math.max(0, slices.findIndex(chosen));
  // The strip opens at what is chosen then, and does not move away later under a finger that chooses.
  const [openedAt] = useState(firstChosen);
  const [reached, setReached] = useState<number | null>(null);
  const inTabOrder = reached ?? firstChosen;
  useEffect(() => {
    const box = strip.current;
    const cell = box?.children[openedAt];
    if (box && cell instanceof HTMLElement) box.scrollLeft = cell.offsetLeft - (box.clientWidth - cell.offsetWidth) / 2;
  }, [openedAt, slices.length]);
  const go = (event: KeyboardEvent): void => {
    const step = steps[event.key];
    if (step === undefined) return;
    event.preventDefault();
    const next = Math.max(0, Math.min(slices.length - 1, inTabOrder + step));
    setReached(next);
    const control = strip.current?.children[next]?.firstElementChild;
    if (control instanceof HTMLElement) control.focus();
  };
  return (
    <div
      ref={strip}
      role={many ? 'group' : 'radiogroup'}
      aria-label={label}
      onKeyDown={go}
      style={{ position: 'relative', display: 'flex', gap: space(1), overflowX: 'auto', maxWidth: '100%', paddingBottom: space(2) }}
    >
      {slices.map((slice, index) => {
        const on = chosen(slice);
        return (
          <div key={sliceKey(slice)} style={{ flex: 'none' }}>
            <Press
              role={many ? 'checkbox' : 'radio'}
              aria-checked={on}
              aria-label={`slice ${index + 1} of ${slices.length}`}
              tabIndex={index === inTabOrder ? 0 : -1}
              pressOnSpace
              onPress={() => onPress(slice)}
              style={() => ({ borderWidth: 2, borderColor: on ? colours.weldThread : 'transparent', alignItems: 'center' })}
            >
              <Picture source={frameThumbnailOf(slice.imageId, slice.frame)} alt="" size={size} />
              <Text variant="small" tone={tone}>
                {index + 1}
              </Text>
            </Press>
          </div>
        );
      })}
    </div>
  );
}
