/** A trial: image and k-space in stitched frames, the recipe in words, the numbers against the bad image. */
import { View } from 'react-native';
import { trialThumbnailOf } from '@/components/api/trials';
import { Badge } from '@/components/ui/badge';
import { LinkText } from '@/components/ui/link-text';
import { Picture } from '@/components/ui/picture';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { Trial } from '@/server/contract/case-parts';
import { SaveTrial } from './save-trial';

interface TrialRowProps {
  caseId: string;
  trial: Trial;
  words: string;
  wide: boolean;
}

export const threeFigures = (value: number | null): string => (value === null ? '–' : value.toFixed(3));

export function TrialRow({ caseId, trial, words, wide }: TrialRowProps) {
  const { colours } = useTheme();
  const { nrmse, ssim } = trial.metrics;
  const pictures = (
    <View style={{ flexDirection: 'row', gap: space(2) }}>
      <Picture source={trialThumbnailOf(caseId, trial.id)} alt={`trial ${trial.number}, simulated`} size={64} simulated />
      <Picture
        source={trialThumbnailOf(caseId, trial.id, 'kspace')}
        alt={`k-space of trial ${trial.number}, simulated`}
        size={64}
        simulated
      />
    </View>
  );
  const open = (
    <LinkText
      label="open"
      name={`open trial ${trial.number} on the bench`}
      href={{ pathname: '/cases/[caseId]/bench', params: { caseId, trial: trial.id } }}
    />
  );
  const frame = {
    flexDirection: 'row',
    gap: space(4),
    borderBottomWidth: 1,
    borderBottomColor: colours.rule,
    paddingVertical: space(3),
  } as const;
  if (wide) {
    return (
      <View role="row" style={{ ...frame, alignItems: 'center' }}>
        <Text variant="mono" role="cell" style={{ width: 24 }}>
          {trial.number}
        </Text>
        <View role="cell">{pictures}</View>
        <View role="cell" style={{ flex: 1, gap: 2 }}>
          <Text variant="row" style={{ fontSize: 14 }}>
            {words}
          </Text>
          <Badge glyph="simulated" word="simulated" tone="orchil" small />
          {trial.note ? (
            <Text variant="detail" tone="inkSoft">
              {trial.note}
            </Text>
          ) : null}
        </View>
        <Text variant="mono" role="cell" style={{ width: 64, textAlign: 'right' }}>
          {threeFigures(nrmse)}
        </Text>
        <Text variant="mono" role="cell" style={{ width: 64, textAlign: 'right' }}>
          {threeFigures(ssim)}
        </Text>
        <View role="cell" style={{ flexDirection: 'row', alignItems: 'center', gap: space(1) }}>
          <SaveTrial caseId={caseId} trial={trial} />
          {open}
        </View>
      </View>
    );
  }
  return (
    <View style={{ ...frame, paddingHorizontal: 3 }}>
      {pictures}
      <View style={{ flex: 1, gap: 2 }}>
        <Text variant="detail">
          {trial.number} {words}
        </Text>
        <Badge glyph="simulated" word="simulated" tone="orchil" small />
        <View style={{ flexDirection: 'row', alignItems: 'center', justifyContent: 'space-between' }}>
          <Text variant="small">
            NRMSE {threeFigures(nrmse)} SSIM {threeFigures(ssim)}
          </Text>
          <View style={{ marginVertical: -14, flexDirection: 'row', alignItems: 'center', gap: space(1) }}>
            <SaveTrial caseId={caseId} trial={trial} />
            {open}
          </View>
        </View>
      </View>
    </View>
  );
}
