/** A day, chosen with the browser's own calendar; empty is allowed. */
import { useId } from 'react';
import { View } from 'react-native';
import { Glyph } from './glyph';
import { Text } from './text';
import { fonts, radius, space } from './theme';
import { useTheme } from './theme-context';

interface DayFieldProps {
  label: string;
  /** `2026-05-21`, or empty. */
  value: string;
  onChange: (day: string) => void;
  error?: string | undefined;
  note?: string;
  latest?: string;
}

export function DayField({ label, value, onChange, error, note, latest }: DayFieldProps) {
  const { colours } = useTheme();
  const id = useId();
  return (
    <View style={{ gap: space(1) }}>
      <Text variant="small" tone="inkSoft" nativeID={`${id}-label`}>
        {label}
      </Text>
      <input
        type="date"
        value={value}
        max={latest}
        aria-labelledby={`${id}-label`}
        aria-describedby={`${id}-note`}
        aria-invalid={Boolean(error)}
        onChange={(event) => onChange(event.currentTarget.value)}
        style={{
          boxSizing: 'border-box',
          height: 48,
          maxWidth: 220,
          padding: '0 12px',
          border: `${error ? 2 : 1}px solid ${error ? colours.madder : colours.ruleStrong}`,
          borderRadius: radius.control,
          background: colours.clothRaised,
          color: colours.ink,
          fontFamily: fonts.mono,
          fontSize: 16,
        }}
      />
      {error || note ? (
        <View nativeID={`${id}-note`} role={error ? 'alert' : undefined} style={{ flexDirection: 'row', gap: 6 }}>
          {error ? <Glyph name="danger" colour={colours.madder} size={14} /> : null}
          <Text variant="small" tone={error ? 'madder' : 'inkSoft'}>
            {error ?? note}
          </Text>
        </View>
      ) : null}
    </View>
  );
}
