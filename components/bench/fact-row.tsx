/** What, and its value at the right; under it where it came from, where that is not plain. */
import type { ReactNode } from 'react';
import { View } from 'react-native';
import { Text, type TextTone } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';

interface FactRowProps {
  label: ReactNode;
  value: string;
  unit?: string;
  note?: string | undefined;
  tone?: TextTone;
}

export function FactRow({ label, value, unit, note, tone = 'ink' }: FactRowProps) {
  const { colours } = useTheme();
  return (
    <View style={{ paddingVertical: 5, borderBottomWidth: 1, borderBottomColor: colours.rule }}>
      <View style={{ flexDirection: 'row', alignItems: 'baseline', gap: space(3) }}>
        {typeof label === 'string' ? (
          <Text variant="detail" style={{ flexShrink: 1 }}>
            {label}
          </Text>
        ) : (
          label
        )}
        <Text variant="mono" tone={tone} style={{ marginLeft: 'auto', textAlign: 'right' }}>
          {value}
          {unit ? (
            <Text variant="mono" tone="inkFaint">
              {` ${unit}`}
            </Text>
          ) : null}
        </Text>
      </View>
      {note ? (
        <Text variant="small" tone="inkFaint">
          {note}
        </Text>
      ) : null}
    </View>
  );
}
