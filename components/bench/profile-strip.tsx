/**
 * The values along the phase encoding through the cursor: bad solid, simulated stitched. Ghosts, wrap and missing lines run along this
 * axis, so that one line through the picture shows them.
 */
import { useMemo, useState } from 'react';
import { View } from 'react-native';
import type { Domain } from '@/components/image/edge-scale';
import { kspaceGrid } from '@/components/image/kspace-grid';
import { profilePath, profileThrough } from '@/components/image/profile';
import { Text } from '@/components/ui/text';
import { fonts } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import { useBench } from './bench-context';
import { hasOwnPhase } from './own-phase';

const height = 36;

function useProfiles(domain: Domain) {
  const { bad: badImage, badPlanes, simulation, view, frame, phaseEncode } = useBench();
  const kspaceName = view.kspaceOf === 'acquired' && hasOwnPhase(badImage) ? 'kspace.log' : 'kspaceOfImage.log';
  const axis = phaseEncode === 'row' ? 'columns' : 'rows';
  const bad = domain === 'image' ? badPlanes.image?.get('image') : badPlanes.kspace?.get('kspace.log');
  const simulated = simulation.shown?.planes.get(domain === 'image' ? 'image' : kspaceName);
  const gain = domain === 'image' ? (simulation.shown?.metrics?.gain ?? 1) : 1;
  const { cursor } = view;
  return useMemo(() => {
    const grid = domain === 'image' ? frame : kspaceGrid(frame);
    return {
      bad: bad ? profileThrough(bad, cursor, axis, grid) : [],
      simulated: simulated ? profileThrough(simulated, cursor, axis, grid).map((value) => (value === null ? null : value * gain)) : [],
      at: axis === 'rows' ? cursor.row : cursor.column,
      n: axis === 'rows' ? grid.rows : grid.columns,
    };
  }, [bad, simulated, cursor, axis, frame, domain, gain]);
}

export function ProfileStrip({ domain }: { domain: Domain }) {
  const { colours } = useTheme();
  const { view } = useBench();
  const [width, setWidth] = useState(0);
  const profiles = useProfiles(domain);
  const window = domain === 'image' ? view.imageWindow : view.logWindow;
  const range = [window.level - window.width / 2, window.level + window.width / 2] as const;
  const cursorX = ((profiles.at + 0.5) / profiles.n) * width;
  const name = domain === 'image' ? 'Values along the phase encoding' : 'Log size along the phase encoding';
  return (
    <View onLayout={({ nativeEvent }) => setWidth(Math.floor(nativeEvent.layout.width))}>
      <View style={{ flexDirection: 'row', height: 20, alignItems: 'center' }}>
        <Text variant="small" numberOfLines={1} style={{ flexShrink: 1 }}>
          {name}
        </Text>
        <Text variant="small" tone="inkFaint" numberOfLines={1} style={{ marginLeft: 'auto', paddingLeft: 8 }}>
          through the cursor
        </Text>
      </View>
      <svg
        width={width}
        height={height + 16}
        role="img"
        aria-label={`${name} through the cursor: bad solid, simulated stitched`}
        style={{ display: 'block' }}
      >
        <path d={`M0 ${height + 0.5}H${width}`} stroke={colours.ruleStrong} shapeRendering="crispEdges" />
        <path d={profilePath(profiles.bad, range, width, height)} fill="none" stroke={colours.madder} strokeWidth={1.25} />
        <path
          d={profilePath(profiles.simulated, range, width, height)}
          fill="none"
          stroke={colours.orchil}
          strokeWidth={1.25}
          strokeDasharray="4 3"
        />
        <path d={`M${cursorX} 0V${height + 4}`} stroke={colours.weldThread} strokeWidth={1.5} />
        <g fontFamily={fonts.mono} fontSize={11} fill={colours.inkFaint}>
          <text x={0} y={height + 14}>
            0
          </text>
          <text x={width} y={height + 14} textAnchor="end">
            {profiles.n - 1}
          </text>
        </g>
        <text
          x={Math.min(width - 36, Math.max(24, cursorX))}
          y={height + 14}
          textAnchor="middle"
          fontFamily={fonts.monoSemiBold}
          fontSize={11}
          fill={colours.weld}
        >
          {profiles.at}
        </text>
      </svg>
    </View>
  );
}
