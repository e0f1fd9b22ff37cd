/** A square to tick, with a sentence and, under it, what it means. */
import { View } from 'react-native';
import { ChoiceBox } from './choice-box';
import { Press } from './press';
import { Text } from './text';
import { space, touchTarget } from './theme';

interface CheckBoxProps {
  label: string;
  note?: string;
  checked: boolean;
  disabled?: boolean;
  onChange: (checked: boolean) => void;
}

export function CheckBox({ label, note, checked, disabled = false, onChange }: CheckBoxProps) {
  return (
    <Press
      role="checkbox"
      aria-checked={checked}
      aria-label={note ? `${label} ${note}` : label}
      disabled={disabled}
      pressOnSpace
      onPress={() => onChange(!checked)}
      style={() => ({ minHeight: touchTarget, flexDirection: 'row', gap: space(3), paddingVertical: space(3) })}
    >
      <View style={{ paddingTop: 1 }}>
        <ChoiceBox many on={checked} disabled={disabled} size={18} />
      </View>
      <View style={{ flex: 1 }}>
        <Text variant="detailStrong">{label}</Text>
        {note ? (
          <Text variant="detail" tone="inkSoft">
            {note}
          </Text>
        ) : null}
      </View>
    </Press>
  );
}
