/** A choice from a list: a field that opens a menu (`field`), or a word with its value in a filter band (`filter`). */
import { useId, useRef, useState } from 'react';
import { View } from 'react-native';
import { Glyph } from './glyph';
import { anchorOf, Menu, type Anchor, type MenuRow } from './menu';
import { Press } from './press';
import { insideBar } from './stitches';
import { Text } from './text';
import { fonts, radius, space, touchTarget } from './theme';
import { useTheme } from './theme-context';

/** A longer value is set smaller, on two lines where it must. */
const shortValue = 24;

interface SelectProps {
  label: string;
  rows: readonly MenuRow[];
  value: string;
  onChange: (id: string) => void;
  look?: 'field' | 'filter';
  disabled?: boolean;
  error?: string | undefined;
}

export function Select({ label, rows, value, onChange, look = 'field', disabled = false, error }: SelectProps) {
  const { colours } = useTheme();
  const id = useId();
  const trigger = useRef<View>(null);
  const [anchor, setAnchor] = useState<Anchor | null>(null);
  const shown = rows.find((row) => row.id === value)?.label ?? 'choose';
  const close = (): void => {
    setAnchor(null);
    trigger.current?.focus();
  };
  const filter = look === 'filter';
  return (
    <View style={{ gap: space(1) }}>
      {filter ? null : (
        <Text variant="small" tone="inkSoft" nativeID={id}>
          {label}
        </Text>
      )}
      <View ref={trigger} tabIndex={-1}>
        <Press
          onPress={() => setAnchor(anchorOf(trigger.current))}
          disabled={disabled}
          aria-label={`${label}: ${shown}`}
          aria-expanded={anchor !== null}
          {...{ 'aria-haspopup': 'menu' }}
          style={({ hovered }) => [
            { minHeight: filter ? touchTarget : 48, flexDirection: 'row', alignItems: 'center', gap: 6 },
            filter
              ? null
              : {
                  paddingHorizontal: space(3),
                  borderWidth: error ? 2 : 1,
                  borderRadius: radius.control,
                  borderStyle: disabled ? 'dashed' : 'solid',
                  borderColor: error ? colours.madder : colours.ruleStrong,
                  backgroundColor: disabled ? 'transparent' : colours.clothRaised,
                },
            hovered ? insideBar('bottom', 2, colours.indigo) : null,
          ]}
        >
          {filter ? (
            // The space is part of the text: what is seen and what is spoken are the same words.
            <Text variant="small" tone="inkSoft" style={{ marginRight: -6 }}>
              {`${label} `}
            </Text>
          ) : null}
          <Text
            variant={filter ? 'small' : 'mono'}
            numberOfLines={filter ? 1 : 2}
            style={
              filter
                ? { fontFamily: fonts.monoMedium }
                : { flex: 1, fontSize: shown.length > shortValue ? 13 : 16, lineHeight: shown.length > shortValue ? 16 : 20 }
            }
          >
            {shown}
          </Text>
          <Glyph name="down" size={filter ? 12 : 16} colour={filter ? colours.inkSoft : colours.ink} />
        </Press>
      </View>
      {error ? (
        <View role="alert" style={{ flexDirection: 'row', gap: 6, paddingTop: 2 }}>
          <Glyph name="danger" colour={colours.madder} size={14} />
          <Text variant="small" tone="madder" style={{ flexShrink: 1 }}>
            {error}
          </Text>
        </View>
      ) : null}
      {anchor ? (
        <Menu
          label={label}
          anchor={anchor}
          rows={rows}
          chosen={value}
          onClose={close}
          onChoose={(chosen) => {
            close();
            onChange(chosen);
          }}
        />
      ) : null}
    </View>
  );
}
