/** A number that can be typed in its place: underlined where it stands, taken on Enter and on leaving, refused with its range. */
import { useState } from 'react';
import { TextInput } from 'react-native';
import { fixed, parseNumber } from './number-text';
import { textVariants } from './text';
import { useTheme } from './theme-context';

interface NumberInputProps {
  label: string;
  value: number;
  decimals: number;
  min: number;
  max: number;
  onChange: (value: number) => void;
  /** Says why a typed value was not taken, or null when all is well again. */
  onRefused?: (reason: string | null) => void;
  width?: number;
  quiet?: boolean;
  disabled?: boolean;
}

export function NumberInput({
  label,
  value,
  decimals,
  min,
  max,
  onChange,
  onRefused,
  width = 64,
  quiet = false,
  disabled = false,
}: NumberInputProps) {
  const { colours } = useTheme();
  const [typed, setTyped] = useState<string | null>(null);
  const take = (): void => {
    if (typed === null) return;
    const number = parseNumber(typed);
    const fits = number !== null && number >= min && number <= max;
    onRefused?.(fits ? null : `${fixed(min, decimals)} – ${fixed(max, decimals)}: ${typed.trim() || 'nothing'} is not in this range`);
    if (fits && number !== value) onChange(number);
    setTyped(null);
  };
  return (
    <TextInput
      aria-label={label}
      value={typed ?? fixed(value, decimals)}
      onChangeText={setTyped}
      onBlur={take}
      onSubmitEditing={take}
      editable={!disabled}
      selectTextOnFocus
      inputMode="decimal"
      style={[
        textVariants.number,
        quiet ? { fontSize: 13 } : null,
        { width, minHeight: 24, textAlign: 'right', color: disabled ? colours.inkFaint : colours.ink, paddingHorizontal: 2 },
        { borderBottomWidth: 1, borderBottomColor: typed === null && !quiet ? 'transparent' : colours.indigo },
      ]}
    />
  );
}
