/**
 * A menu: 44-pixel rows under the control that opened it. Arrows, Home and End move; Enter and Space choose; Escape and a press
 * outside close. The row that stands holds an indigo bar.
 */
import { useEffect, useRef, type KeyboardEvent } from 'react';
import { Modal, Pressable, ScrollView, useWindowDimensions, View } from 'react-native';
import { Glyph } from './glyph';
import type { GlyphName } from './glyph-paths';
import { Press } from './press';
import { insideBar } from './stitches';
import { Text } from './text';
import { space, touchTarget } from './theme';
import { useTheme } from './theme-context';

export interface MenuRow {
  readonly id: string;
  readonly label: string;
  /** A key or a word at the right. */
  readonly aside?: string | undefined;
  readonly glyph?: GlyphName;
  readonly danger?: boolean;
  readonly disabled?: boolean;
}

/** Where the control that opens the menu stands in the window, CSS pixels. */
export interface Anchor {
  readonly left: number;
  readonly top: number;
  readonly width: number;
  readonly height: number;
}

export const anchorOf = (view: View | null): Anchor | null => {
  const box = (view as unknown as HTMLElement | null)?.getBoundingClientRect();
  return box ? { left: box.left, top: box.top, width: box.width, height: box.height } : null;
};

const itemsOf = (view: View | null): HTMLElement[] => [
  ...((view as unknown as HTMLElement | null)?.querySelectorAll<HTMLElement>('[role=menuitemradio]') ?? []),
];

interface MenuProps {
  label: string;
  anchor: Anchor;
  rows: readonly MenuRow[];
  chosen?: string | undefined;
  onChoose: (id: string) => void;
  onClose: () => void;
}

const stepOf = (key: string, index: number, count: number): number | null => {
  if (key === 'ArrowDown') return (index + 1) % count;
  if (key === 'ArrowUp') return (index - 1 + count) % count;
  if (key === 'Home') return 0;
  return key === 'End' ? count - 1 : null;
};

/** Under the anchor where there is room, over it otherwise; always inside the window. */
export function placeMenu(anchor: Anchor, nRows: number, screen: { width: number; height: number }) {
  const width = Math.min(Math.max(anchor.width, 232), screen.width - 2 * space(2));
  const wanted = nRows * touchTarget + 2;
  const below = screen.height - (anchor.top + anchor.height) - space(3);
  const under = below >= wanted || below >= anchor.top;
  const height = Math.min(wanted, under ? below : anchor.top - space(3));
  const left = Math.max(space(2), Math.min(anchor.left, screen.width - width - space(2)));
  return { left, width, maxHeight: height, top: under ? anchor.top + anchor.height + 2 : anchor.top - height - 2 };
}

export function Menu({ label, anchor, rows, chosen, onChoose, onClose }: MenuProps) {
  const { colours } = useTheme();
  const list = useRef<View>(null);
  const screen = useWindowDimensions();
  const standing = useRef(
    Math.max(
      0,
      rows.findIndex((row) => row.id === chosen),
    ),
  );
  useEffect(() => itemsOf(list.current)[standing.current]?.focus(), []);
  const move = (event: KeyboardEvent, index: number): void => {
    const next = stepOf(event.key, index, rows.length);
    if (next === null) return;
    event.preventDefault();
    itemsOf(list.current)[next]?.focus();
  };
  return (
    <Modal transparent visible animationType="none" onRequestClose={onClose}>
      <Pressable aria-label="close the menu" tabIndex={-1} onPress={onClose} style={{ position: 'absolute', inset: 0, cursor: 'auto' }} />
      <View
        ref={list}
        role="menu"
        aria-label={label}
        style={{
          position: 'absolute',
          ...placeMenu(anchor, rows.length, screen),
          backgroundColor: colours.clothRaised,
          borderWidth: 1,
          borderColor: colours.ruleStrong,
        }}
      >
        <ScrollView>
          {rows.map((row, index) => (
            <Press
              key={row.id}
              role={'menuitemradio' as 'menuitem'}
              aria-checked={row.id === chosen}
              aria-label={row.label}
              disabled={row.disabled ?? false}
              pressOnSpace
              onPress={() => onChoose(row.id)}
              onKeyDown={(event) => move(event, index)}
              style={({ hovered }) => [
                { minHeight: touchTarget, flexDirection: 'row', alignItems: 'center', gap: space(2), paddingHorizontal: space(3) },
                index > 0 ? { borderTopWidth: 1, borderTopColor: colours.rule } : null,
                hovered ? { backgroundColor: colours.clothSunk } : null,
                row.id === chosen ? insideBar('left', 3, colours.indigo) : null,
              ]}
            >
              {row.glyph ? <Glyph name={row.glyph} colour={row.danger ? colours.madder : colours.ink} /> : null}
              <Text variant="mono" tone={row.danger ? 'madder' : row.disabled ? 'inkFaint' : 'ink'} style={{ flex: 1 }} numberOfLines={1}>
                {row.label}
              </Text>
              {row.aside ? (
                <Text variant="small" tone="inkFaint">
                  {row.aside}
                </Text>
              ) : null}
            </Press>
          ))}
        </ScrollView>
      </View>
    </Modal>
  );
}
