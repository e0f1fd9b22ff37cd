/** The numbers of the comparison with what they mean, the regions they were taken from, and why one is missing. */
import { View } from 'react-native';
import { fixed, significant } from '@/components/ui/number-text';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { EyeHeading } from './eye-heading';
import { FactRow } from './fact-row';
import { useBench } from './bench-context';
import { WindowLine } from './window-line';

const regionWords = { object: 'object', ghost: 'ghost region', air: 'air' } as const;
const orDash = (value: number | null | undefined, decimals: number): string =>
  value === null || value === undefined ? '–' : fixed(value, decimals);

export function NumbersTab() {
  const { simulation } = useBench();
  const metrics = simulation.shown?.metrics;
  return (
    <View>
      <EyeHeading title="Comparison" aside="simulated against bad" />
      <FactRow label="NRMSE, after the gain" value={orDash(metrics?.nrmse, 3)} />
      <FactRow label="SSIM, 11 × 11 Gaussian" value={orDash(metrics?.ssim, 3)} />
      <FactRow label="gain, least squares" value={orDash(metrics?.gain, 3)} />
      <FactRow label="ghost ÷ signal, simulated" value={orDash(metrics?.ghostRatio, 3)} />
      <FactRow label="ghost ÷ signal, bad image" value={orDash(metrics?.ghostRatioOfBad, 3)} />
      {metrics?.reason ? (
        <Text variant="detail" tone="inkSoft" style={{ paddingVertical: space(2) }}>
          {`Not measurable because ${metrics.reason}`}
        </Text>
      ) : null}
      {metrics?.ghostRegions?.length ? <EyeHeading title="Regions" aside="mean value" /> : null}
      {metrics?.ghostRegions?.map(({ kind, pixels, mean }, i) => (
        <FactRow key={i} label={`${regionWords[kind]}, ${pixels} px`} value={significant(mean)} />
      ))}
      <EyeHeading title="Window and level" aside="or drag on a picture" />
      <Text variant="detail">image</Text>
      <View style={{ minHeight: 36, justifyContent: 'center' }}>
        <WindowLine domain="image" bare />
      </View>
      <Text variant="detail">k-space, decades</Text>
      <View style={{ minHeight: 36, justifyContent: 'center' }}>
        <WindowLine domain="kspace" bare />
      </View>
    </View>
  );
}
