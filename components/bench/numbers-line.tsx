/** The numbers of the comparison in one line. What cannot be measured says so with a dash; the reason stands in the numbers tab. */
import { View } from 'react-native';
import { Badge } from '@/components/ui/badge';
import { LinkText } from '@/components/ui/link-text';
import { fixed } from '@/components/ui/number-text';
import { Text } from '@/components/ui/text';
import { fonts, space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import { useBench } from './bench-context';
import type { Keep } from './use-keep-as-trial';

interface NumberProps {
  label: string;
  value: number | null | undefined;
  decimals: number;
  aside?: string | undefined;
  compact: boolean;
}

function Figure({ label, value, decimals, aside, compact }: NumberProps) {
  return (
    <Text variant="mono" tone={compact ? 'inkFaint' : 'inkSoft'} numberOfLines={1}>
      {label}{' '}
      <Text variant="mono" style={compact ? { fontFamily: fonts.monoMedium } : { fontFamily: fonts.monoMedium, fontSize: 18 }}>
        {value === null || value === undefined ? '–' : fixed(value, decimals)}
      </Text>
      {aside ? (
        <Text variant="mono" tone="inkFaint">
          {` ${aside}`}
        </Text>
      ) : null}
    </Text>
  );
}

interface NumbersLineProps {
  compact?: boolean;
  keep?: Keep;
}

/** On what the recipe ran, or under which number it was just kept. */
function Aside({ keep }: { keep: Keep | undefined }) {
  const { kase, runsOn } = useBench();
  if (keep?.kept) {
    return (
      <View style={{ marginLeft: 'auto', flexDirection: 'row', alignItems: 'center', gap: space(3) }}>
        <View>
          <Badge glyph="verified" word={`kept as trial ${keep.kept.number}`} small />
        </View>
        <LinkText label="to the case" href={`/cases/${kase.id}`} />
      </View>
    );
  }
  return (
    <Text variant="small" tone="inkFaint" style={{ marginLeft: 'auto' }} numberOfLines={1}>
      {runsOn === 'comparison' ? 'simulated on the comparison image' : 'simulated on the bad image itself'}
    </Text>
  );
}

export function NumbersLine({ compact = false, keep }: NumbersLineProps) {
  const { colours } = useTheme();
  const { simulation } = useBench();
  const metrics = simulation.shown?.metrics;
  const ofBad = metrics?.ghostRatioOfBad;
  const rest = ofBad === null || ofBad === undefined ? undefined : `of ${fixed(ofBad, 2)}`;
  return (
    <View
      role="status"
      aria-label="numbers of the comparison"
      style={
        compact
          ? { flexDirection: 'row', gap: space(2), height: 28, alignItems: 'center' }
          : {
              flexDirection: 'row',
              gap: space(6),
              height: 44,
              alignItems: 'center',
              paddingHorizontal: space(6),
              borderBottomWidth: 1,
              borderBottomColor: colours.rule,
            }
      }
    >
      <Figure label="NRMSE" value={metrics?.nrmse} decimals={3} compact={compact} />
      <Figure label="SSIM" value={metrics?.ssim} decimals={3} compact={compact} />
      <Figure label={compact ? 'ghost' : 'ghost ÷ signal'} value={metrics?.ghostRatio} decimals={2} aside={rest} compact={compact} />
      {compact ? null : <Aside keep={keep} />}
    </View>
  );
}
