/** The line over the bench: which case, in which state, the way back, undo and redo, keep as trial. */
import { useRef, useState } from 'react';
import { View } from 'react-native';
import { StateBadge } from '@/components/case/state-badge';
import { caseNumber } from '@/components/case/words';
import { Button } from '@/components/ui/button';
import { Glyph } from '@/components/ui/glyph';
import { GlyphButton } from '@/components/ui/glyph-button';
import { anchorOf, Menu, type Anchor } from '@/components/ui/menu';
import { Press } from '@/components/ui/press';
import { insideBar } from '@/components/ui/stitches';
import { Text } from '@/components/ui/text';
import { fonts, space, type LayoutWidth } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import { useBench } from './bench-context';
import { BenchFiles } from './bench-files';
import type { Keep } from './use-keep-as-trial';

interface BenchHeaderProps {
  layout: LayoutWidth;
  keep: Keep;
}

function Title({ layout }: { layout: LayoutWidth }) {
  const { kase } = useBench();
  const wide = layout === 'wide';
  return (
    <Press
      href={`/cases/${kase.id}`}
      aria-label={`case ${caseNumber(kase.number)}: ${kase.title}`}
      style={() => ({ minHeight: 44, justifyContent: 'center', flexShrink: 1, minWidth: 0 })}
    >
      {({ hovered }) => (
        <Text
          level={1}
          variant={layout === 'phone' ? 'mono' : 'number'}
          numberOfLines={1}
          style={{
            fontFamily: fonts.mono,
            fontSize: layout === 'phone' ? 13 : wide ? 15 : 14,
            textDecorationLine: hovered ? 'underline' : 'none',
          }}
        >
          <Text variant="number" style={{ fontFamily: fonts.monoSemiBold, fontSize: layout === 'phone' ? 13 : wide ? 15 : 14 }}>
            {caseNumber(kase.number)}
          </Text>{' '}
          {kase.title}
        </Text>
      )}
    </Press>
  );
}

/** Undo and redo with their words, on a wide screen. */
function StepBack({ direction, disabled, onPress }: { direction: 'undo' | 'redo'; disabled: boolean; onPress: () => void }) {
  const { colours } = useTheme();
  const tone = disabled ? 'inkFaint' : 'ink';
  return (
    <Press
      aria-label={direction}
      disabled={disabled}
      aria-disabled={disabled}
      onPress={onPress}
      style={({ hovered }) => [
        { minHeight: 44, flexDirection: 'row', alignItems: 'center', gap: space(2), paddingHorizontal: 10 },
        hovered ? insideBar('bottom', 2, colours.indigo) : null,
      ]}
    >
      <Glyph name={direction} colour={colours[tone]} />
      <Text variant="mono" tone={tone}>
        {direction}
      </Text>
    </Press>
  );
}

function MoreMenu({ keep }: { keep: Keep }) {
  const { kase, dispatch, history } = useBench();
  const { preference, name, choose } = useTheme();
  const trigger = useRef<View>(null);
  const [anchor, setAnchor] = useState<Anchor | null>(null);
  const actions: Record<string, () => void> = {
    keep: keep.run,
    redo: () => dispatch({ kind: 'redo' }),
    theme: () => choose(name === 'dark' ? 'light' : 'dark'),
  };
  return (
    <View ref={trigger}>
      <GlyphButton glyph="more" label="more" expanded={anchor !== null} onPress={() => setAnchor(anchorOf(trigger.current))} />
      {anchor ? (
        <Menu
          label={`case ${caseNumber(kase.number)}`}
          anchor={anchor}
          rows={[
            { id: 'keep', label: 'keep as trial', disabled: keep.disabled },
            { id: 'redo', label: 'redo', disabled: history.future.length === 0 },
            { id: 'theme', label: name === 'dark' ? 'light theme' : 'dark theme', aside: preference ?? 'as the bench is' },
          ]}
          onChoose={(id) => {
            setAnchor(null);
            actions[id]?.();
          }}
          onClose={() => setAnchor(null)}
        />
      ) : null}
    </View>
  );
}

export function BenchHeader({ layout, keep }: BenchHeaderProps) {
  const { colours } = useTheme();
  const { kase, history, dispatch } = useBench();
  const [canUndo, canRedo] = [history.past.length > 0, history.future.length > 0];
  const undo = (): void => dispatch({ kind: 'undo' });
  const redo = (): void => dispatch({ kind: 'redo' });
  const line = { flexDirection: 'row', alignItems: 'center', borderBottomWidth: 1, borderBottomColor: colours.rule } as const;
  if (layout === 'phone') {
    return (
      <View style={[line, { height: 44, paddingLeft: 4, borderBottomWidth: 0 }]}>
        <GlyphButton glyph="left" label="back to the case" href={`/cases/${kase.id}`} />
        <View style={{ flex: 1, minWidth: 0 }}>
          <Title layout={layout} />
        </View>
        <GlyphButton glyph="undo" label="undo" disabled={!canUndo} onPress={undo} />
        <BenchFiles keep={keep} />
        <MoreMenu keep={keep} />
      </View>
    );
  }
  const keepButton = (
    <Button
      label="keep as trial"
      kind="first"
      small
      disabled={keep.disabled}
      busy={keep.busy}
      onPress={keep.run}
      style={{ minHeight: 48, borderRadius: 0, paddingHorizontal: 20, marginLeft: 8 }}
    />
  );
  if (layout === 'tablet') {
    return (
      <View style={[line, { height: 48, paddingLeft: 4 }]}>
        <GlyphButton glyph="left" label="back to the case" href={`/cases/${kase.id}`} />
        <View style={{ flex: 1, minWidth: 0 }}>
          <Title layout={layout} />
        </View>
        <GlyphButton glyph="undo" label="undo" disabled={!canUndo} onPress={undo} />
        <GlyphButton glyph="redo" label="redo" disabled={!canRedo} onPress={redo} />
        <BenchFiles keep={keep} />
        {keepButton}
      </View>
    );
  }
  return (
    <View style={[line, { height: 48, paddingLeft: space(6), gap: space(4) }]}>
      <Title layout={layout} />
      <View style={{ width: 1, height: 16, backgroundColor: colours.rule }} />
      <View>
        <StateBadge state={kase.state} />
      </View>
      <View style={{ marginLeft: 'auto', flexDirection: 'row', alignItems: 'center' }}>
        <StepBack direction="undo" disabled={!canUndo} onPress={undo} />
        <StepBack direction="redo" disabled={!canRedo} onPress={redo} />
        <BenchFiles keep={keep} />
        {keepButton}
      </View>
    </View>
  );
}
