/**
 * A pane: the picture alone on a neutral mat, and around it everything that is said about it. Head, edge at the left, picture,
 * selvedge at the right of what was simulated, edge below, readout.
 */
import { useMemo, type ReactNode } from 'react';
import { View } from 'react-native';
import { Selvedge, selvedgeWidth } from '@/components/ui/selvedge';
import { useTheme } from '@/components/ui/theme-context';
import type { PhaseEncode } from './cursor';
import { edgeOf, type Domain } from './edge-scale';
import { edgeThickness, PaneEdge } from './pane-edge';
import { Picture, type PictureProps } from './picture';
import { pointOf } from './picture-points';

interface PaneProps extends PictureProps {
  domain: Domain;
  phaseEncode: PhaseEncode | null;
  /** Whether anything on the picture was simulated. */
  simulated: boolean;
  head?: ReactNode;
  headHeight?: number;
  readout?: ReactNode;
}

export function Pane({ domain, phaseEncode, simulated, head, headHeight = 32, readout, ...picture }: PaneProps) {
  const { colours } = useTheme();
  const { frame: grid, region, width, height, cursor } = picture;
  const left = useMemo(
    () => edgeOf({ domain, axis: 'rows', grid, region, phaseEncode, length: height }),
    [domain, grid, region, phaseEncode, height],
  );
  const below = useMemo(
    () => edgeOf({ domain, axis: 'columns', grid, region, phaseEncode, length: width }),
    [domain, grid, region, phaseEncode, width],
  );
  const at = pointOf([cursor.column, cursor.row], { width, height }, region);
  const inside = (position: number, length: number): number | null => (position >= 0 && position <= length ? position : null);
  const margin = edgeThickness('left', left.isPhaseEncode);
  return (
    <View style={{ backgroundColor: colours.mat, width: margin + width + selvedgeWidth }}>
      {head ? (
        <View
          style={{
            height: headHeight,
            marginLeft: margin,
            width: width + selvedgeWidth,
            flexDirection: 'row',
            alignItems: 'center',
            gap: 8,
          }}
        >
          {head}
        </View>
      ) : null}
      <View style={{ flexDirection: 'row' }}>
        <PaneEdge side="left" edge={left} cursorAt={inside(at.y, height)} />
        <Picture {...picture} />
        {simulated ? <Selvedge height={height} /> : <View style={{ width: selvedgeWidth }} />}
      </View>
      <View style={{ marginLeft: margin }}>
        <PaneEdge side="bottom" edge={below} cursorAt={inside(at.x, width)} />
      </View>
      {readout ? <View style={{ marginLeft: margin }}>{readout}</View> : null}
    </View>
  );
}
