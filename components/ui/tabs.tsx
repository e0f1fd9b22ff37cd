/** Words on one thread; the chosen one is held by a 2-pixel bar. Arrows move between them. */
import { useRef, type KeyboardEvent } from 'react';
import { ScrollView, View } from 'react-native';
import { Glyph } from './glyph';
import type { GlyphName } from './glyph-paths';
import { Press } from './press';
import { insideBar } from './stitches';
import { Text } from './text';
import { space, touchTarget } from './theme';
import { useTheme } from './theme-context';

export interface Tab<Value extends string> {
  readonly value: Value;
  readonly label: string;
  readonly glyph?: GlyphName;
  readonly count?: number | undefined;
}

interface TabsProps<Value extends string> {
  label: string;
  tabs: readonly Tab<Value>[];
  value: Value;
  onChange: (value: Value) => void;
  /** Tabs share the width evenly instead of scrolling. */
  even?: boolean;
  /** A hairline under all of them. */
  ruled?: boolean;
}

export function Tabs<Value extends string>({ label, tabs, value, onChange, even = false, ruled = true }: TabsProps<Value>) {
  const { colours } = useTheme();
  const list = useRef<View>(null);
  const move = (event: KeyboardEvent, index: number): void => {
    const step = { ArrowRight: 1, ArrowLeft: -1 }[event.key];
    if (step === undefined) return;
    event.preventDefault();
    const next = (index + step + tabs.length) % tabs.length;
    const tab = tabs[next];
    if (tab) onChange(tab.value);
    (list.current as unknown as HTMLElement | null)?.querySelectorAll<HTMLElement>('[role=tab]')[next]?.focus();
  };
  return (
    <View style={ruled ? insideBar('bottom', 1, colours.rule) : null}>
      <ScrollView horizontal showsHorizontalScrollIndicator={false} contentContainerStyle={{ flexGrow: 1 }}>
        <View
          ref={list}
          role="tablist"
          aria-label={label}
          style={{ flexDirection: 'row', flexGrow: 1, paddingHorizontal: even ? 0 : space(1) }}
        >
          {tabs.map((tab, index) => {
            const on = tab.value === value;
            return (
              <Press
                key={tab.value}
                role="tab"
                aria-selected={on}
                aria-label={tab.count === undefined ? tab.label : `${tab.label} ${tab.count}`}
                tabIndex={on ? 0 : -1}
                onPress={() => onChange(tab.value)}
                onKeyDown={(event) => move(event, index)}
                style={({ hovered }) => [
                  {
                    minHeight: touchTarget,
                    flexDirection: 'row',
                    alignItems: 'center',
                    justifyContent: 'center',
                    paddingHorizontal: even ? space(1) : space(3),
                  },
                  even ? { flexGrow: 1 } : null,
                  on ? insideBar('bottom', 2, colours.indigo) : hovered ? insideBar('bottom', 2, colours.ruleStrong) : null,
                ]}
              >
                {tab.glyph ? (
                  <View style={{ paddingRight: 6 }}>
                    <Glyph name={tab.glyph} colour={on ? colours.ink : colours.inkSoft} />
                  </View>
                ) : null}
                <Text variant={on ? 'labelStrong' : 'mono'} tone={on ? 'ink' : 'inkSoft'} numberOfLines={1}>
                  {tab.label}
                </Text>
                {tab.count === undefined ? null : (
                  <Text variant={on ? 'labelStrong' : 'mono'} tone={on ? 'ink' : 'inkFaint'}>
                    {/* The space is part of the text: what is seen and what is spoken are the same words. */}
                    {` ${tab.count}`}
                  </Text>
                )}
              </Press>
            );
          })}
        </View>
      </ScrollView>
    </View>
  );
}
