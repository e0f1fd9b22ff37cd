/** The glass: the 13 × 13 samples around the cursor, magnified, with the sample itself in its square. */
import { memo } from 'react';
import { onImage } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { ColourTable } from './colour-table';
import { cropAround, glassSamples } from './crop';
import type { Cursor } from './cursor';
import type { DisplayPlane } from './display-plane';
import { PixelPlane } from './pixel-plane';

interface GlassProps {
  plane: DisplayPlane;
  table: ColourTable;
  mask?: DisplayPlane | undefined;
  cursor: Cursor;
  /** Side in pixels: a multiple of 13 keeps the samples equal. */
  side?: number;
}

export const Glass = memo(function Glass({ plane, table, mask, cursor, side = 78 }: GlassProps) {
  const { colours } = useTheme();
  const sample = side / glassSamples;
  const from = (side - sample) / 2 - 0.5;
  const square = { x: from, y: from, width: sample + 1, height: sample + 1, fill: 'none' };
  return (
    <div
      role="img"
      aria-label={`the glass: ${glassSamples} by ${glassSamples} samples around the cursor`}
      style={{ position: 'relative', width: side, height: side, flex: 'none', outline: `1px solid ${colours.weldThread}` }}
    >
      <PixelPlane
        plane={cropAround(plane, cursor)}
        table={table}
        mask={mask && cropAround(mask, cursor)}
        name="glass"
        style={{ width: side, height: side }}
      />
      <svg width={side} height={side} aria-hidden style={{ position: 'absolute', left: 0, top: 0 }}>
        <rect {...square} stroke={onImage.casing} strokeWidth={3.5} />
        <rect {...square} stroke={onImage.mark} strokeWidth={1.5} />
      </svg>
    </div>
  );
});
