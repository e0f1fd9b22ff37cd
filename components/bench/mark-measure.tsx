/** What lies under a mark of the image, measured on the stored values: statistics of a region, the profile along a ruler. */
import { useState } from 'react';
import { View } from 'react-native';
import { useProfile, useRegionStatistics } from '@/components/api/measurements';
import { profilePath } from '@/components/image/profile';
import { significant } from '@/components/ui/number-text';
import { Text } from '@/components/ui/text';
import { useTheme } from '@/components/ui/theme-context';
import type { Mark } from '@/server/contract/case-parts';

type Point = readonly [number, number];
interface Measured {
  mark: Mark;
  from: Point;
  to: Point;
}

const Line = ({ words }: { words: string }) => (
  <Text variant="small" tone="inkSoft">
    {words}
  </Text>
);

function RegionMeasure({ mark, from, to, shape }: Measured & { shape: 'rectangle' | 'ellipse' }) {
  const { data, error } = useRegionStatistics(mark.imageId, mark.frame, shape, from, to);
  if (error) return <Line words={error.message} />;
  if (!data) return <Line words="measuring" />;
  const { mean, standardDeviation, min, max, pixels } = data;
  return (
    <Line
      words={`mean ${significant(mean)}, SD ${significant(standardDeviation)}, ${significant(min)} to ${significant(max)}, ${pixels} px`}
    />
  );
}

const height = 28;

function RulerMeasure({ mark, from, to }: Measured) {
  const { colours } = useTheme();
  const [width, setWidth] = useState(0);
  const { data, error } = useProfile(mark.imageId, mark.frame, from, to);
  if (error) return <Line words={error.message} />;
  if (!data) return <Line words="measuring" />;
  const { values, strongest } = data;
  const range = [Math.min(...values), Math.max(...values)] as const;
  const repeat = strongest
    ? `repeats most every ${significant(strongest.periodMm)} mm, ${significant(strongest.frequency)} per metre`
    : 'nothing repeats along it';
  return (
    <View onLayout={({ nativeEvent }) => setWidth(Math.floor(nativeEvent.layout.width))}>
      <svg width={width} height={height} role="img" aria-label={`values along the ruler, ${repeat}`} style={{ display: 'block' }}>
        <path d={`M0 ${height - 0.5}H${width}`} stroke={colours.rule} shapeRendering="crispEdges" />
        <path d={profilePath(values, range, width, height - 2)} fill="none" stroke={colours.ink} strokeWidth={1.25} />
      </svg>
      <Line words={repeat} />
    </View>
  );
}

export function MarkMeasure({ mark }: { mark: Mark }) {
  const [from, to] = mark.points;
  if (mark.domain !== 'image' || from === undefined || to === undefined) return null;
  if (mark.kind === 'ruler') return <RulerMeasure mark={mark} from={from} to={to} />;
  if (mark.kind === 'ellipse' || mark.kind === 'rectangle') return <RegionMeasure mark={mark} from={from} to={to} shape={mark.kind} />;
  return null;
}
