/** A glyph that opens a menu of actions. */
import { useRef, useState } from 'react';
import { View } from 'react-native';
import { GlyphButton } from './glyph-button';
import type { GlyphName } from './glyph-paths';
import { anchorOf, Menu, type Anchor, type MenuRow } from './menu';

interface GlyphMenuProps<Id extends string> {
  glyph: GlyphName;
  label: string;
  rows: readonly (Omit<MenuRow, 'id'> & { readonly id: Id })[];
  onChoose: (id: Id) => void;
}

export function GlyphMenu<Id extends string>({ glyph, label, rows, onChoose }: GlyphMenuProps<Id>) {
  const trigger = useRef<View>(null);
  const [anchor, setAnchor] = useState<Anchor | null>(null);
  return (
    <View ref={trigger}>
      <GlyphButton glyph={glyph} label={label} expanded={anchor !== null} onPress={() => setAnchor(anchorOf(trigger.current))} />
      {anchor ? (
        <Menu
          label={label}
          anchor={anchor}
          rows={rows}
          onClose={() => setAnchor(null)}
          onChoose={(id) => {
            setAnchor(null);
            const row = rows.find((other) => other.id === id);
            if (row) onChoose(row.id);
          }}
        />
      ) : null}
    </View>
  );
}
