/** The words of marks: the letter by which the list calls them, the length of a ruler, a text. The only words on a picture. */
import { memo } from 'react';
import { fonts, onImage } from '@/components/ui/theme';
import type { MarkKind } from './overlay-strokes';
import { pointOf, type Size } from './picture-points';
import type { Region } from './region';

export interface PictureMark {
  readonly id: string;
  /** a, b, c … */
  readonly letter: string;
  readonly kind: MarkKind;
  /** [column, row] */
  readonly points: readonly (readonly [number, number])[];
  readonly text: string;
}

/** Length of a ruler in samples, to a whole one. */
export function rulerPixels(points: PictureMark['points']): number {
  const [from, to] = points;
  if (!from || !to) return 0;
  return Math.round(Math.sqrt((to[0] - from[0]) ** 2 + (to[1] - from[1]) ** 2));
}

/** The same in millimetres; `spacing` is [row, column]. */
export function rulerMm(points: PictureMark['points'], spacing: readonly [number, number]): number {
  const [from, to] = points;
  if (!from || !to) return 0;
  return Math.sqrt(((to[0] - from[0]) * spacing[1]) ** 2 + ((to[1] - from[1]) * spacing[0]) ** 2);
}

function wordOf(mark: PictureMark): string {
  if (mark.kind === 'ruler') return `${rulerPixels(mark.points)} px`;
  return mark.kind === 'text' ? mark.text : mark.letter;
}

interface MarkWordsProps {
  marks: readonly PictureMark[];
  size: Size;
  region: Region;
}

export const MarkWords = memo(function MarkWords({ marks, size, region }: MarkWordsProps) {
  return (
    <svg width={size.width} height={size.height} aria-hidden style={{ position: 'absolute', left: 0, top: 0, pointerEvents: 'none' }}>
      {marks.map((mark) => {
        const points = mark.points.map((point) => pointOf(point, size, region));
        const [from, to = from] = points;
        if (!from || !to) return null;
        const between = mark.kind === 'ruler' || mark.kind === 'ellipse' || mark.kind === 'rectangle';
        const x = between ? (from.x + to.x) / 2 : from.x;
        const y = mark.kind === 'ruler' ? (from.y + to.y) / 2 - 7 : Math.min(from.y, between ? to.y : from.y) - 6;
        return (
          <text
            key={mark.id}
            x={Math.min(size.width - 8, Math.max(8, x))}
            y={Math.min(size.height - 4, Math.max(12, y))}
            textAnchor="middle"
            fontFamily={fonts.monoSemiBold}
            fontSize={12}
            fill={onImage.mark}
            stroke={onImage.casing}
            strokeWidth={3}
            paintOrder="stroke"
          >
            {wordOf(mark)}
          </text>
        );
      })}
    </svg>
  );
});
