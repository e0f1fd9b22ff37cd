/** One bordered line where something happened. What waits is stitched; what failed has a madder bar and a triangle. */
import type { ReactNode } from 'react';
import { View } from 'react-native';
import { Glyph } from './glyph';
import type { GlyphName } from './glyph-paths';
import { Text, type TextTone } from './text';
import { space, touchTarget } from './theme';
import { useTheme } from './theme-context';

export type NoticeKind = 'done' | 'waiting' | 'stale' | 'failed';

const looks: Record<NoticeKind, { glyph: GlyphName; tone: TextTone }> = {
  done: { glyph: 'verified', tone: 'ink' },
  waiting: { glyph: 'waits', tone: 'ink' },
  stale: { glyph: 'comparison', tone: 'orchil' },
  failed: { glyph: 'danger', tone: 'madder' },
};

interface NoticeProps {
  kind: NoticeKind;
  text: string;
  /** What can be done about it, at the right. */
  action?: ReactNode;
}

export function Notice({ kind, text, action }: NoticeProps) {
  const { colours } = useTheme();
  const { glyph, tone } = looks[kind];
  const failed = kind === 'failed';
  return (
    <View
      role={failed ? 'alert' : 'status'}
      style={{
        minHeight: touchTarget,
        flexDirection: 'row',
        alignItems: 'center',
        gap: space(2),
        paddingHorizontal: space(3),
        borderWidth: 1,
        borderLeftWidth: failed ? 3 : 1,
        borderStyle: kind === 'waiting' ? 'dashed' : 'solid',
        borderColor: failed ? colours.madder : colours.ruleStrong,
        backgroundColor: colours.clothRaised,
      }}
    >
      <Glyph name={glyph} colour={colours[tone]} />
      <Text variant="small" tone={tone} style={{ flex: 1, paddingVertical: space(2) }}>
        {text}
      </Text>
      {action}
    </View>
  );
}
