/** Which scanner, which coil: read from the header where it names one of ours, otherwise chosen. */
import { View } from 'react-native';
import { useScanners } from '@/components/api/registry';
import { Badge } from '@/components/ui/badge';
import { ProblemNotice } from '@/components/ui/problem-notice';
import { Select } from '@/components/ui/select';
import { Text } from '@/components/ui/text';
import { gutter, space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { DraftForm } from './use-draft';

const none = { id: '', label: 'not said' };

interface ScannerBandProps {
  form: DraftForm;
  /** The header of the first image named this scanner. */
  fromHeader: boolean;
}

export function ScannerBand({ form, fromHeader }: ScannerBandProps) {
  const { colours } = useTheme();
  const scanners = useScanners();
  const { draft, change } = form;
  const chosen = scanners.data?.find((scanner) => scanner.id === draft.scannerId);
  const chooseScanner = (id: string): void => {
    change('scannerId', id || null);
    change('coilId', null);
  };
  return (
    <View
      style={{
        padding: gutter.phone,
        gap: space(3),
        backgroundColor: colours.clothRaised,
        borderBottomWidth: 1,
        borderBottomColor: colours.rule,
      }}
    >
      {scanners.error ? <ProblemNotice error={scanners.error} onRetry={() => void scanners.refetch()} /> : null}
      {chosen ? (
        <View>
          {fromHeader ? <Badge glyph="verified" word="read from the header" small /> : null}
          <Text variant="title" level={2}>
            {chosen.name}
          </Text>
          <Text variant="small" tone="inkSoft">
            {[chosen.room, chosen.softwareVersion && `software ${chosen.softwareVersion}`, `${chosen.fieldStrengthTesla} T`]
              .filter(Boolean)
              .join(' · ')}
          </Text>
        </View>
      ) : null}
      <View style={{ flexDirection: 'row', gap: space(3) }}>
        <View style={{ flex: 1 }}>
          <Select
            label="scanner"
            value={draft.scannerId ?? ''}
            rows={[none, ...(scanners.data ?? []).map((scanner) => ({ id: scanner.id, label: scanner.name, aside: scanner.room }))]}
            onChange={chooseScanner}
          />
        </View>
        <View style={{ flex: 1 }}>
          <Select
            label="receive coil"
            value={draft.coilId ?? ''}
            disabled={!chosen}
            rows={[none, ...(chosen?.coils ?? []).map((coil) => ({ id: coil.id, label: coil.name, aside: coil.serial }))]}
            onChange={(id) => change('coilId', id || null)}
          />
        </View>
      </View>
    </View>
  );
}
