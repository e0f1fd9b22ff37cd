/** The state of a case in a line: the woven state, how long it has been open, with whom. */
import { View } from 'react-native';
import { Text } from '@/components/ui/text';
import { gutter, space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { Case } from '@/server/contract/cases';
import { ageOf } from '../age';
import { StateBadge } from '../state-badge';
import { useNow } from '../use-now';

interface CaseStripProps {
  found: Case;
  wide: boolean;
}

export function CaseStrip({ found, wide }: CaseStripProps) {
  const { colours } = useTheme();
  const now = useNow();
  const { state, openedAt, assignee } = found;
  const variant = wide ? 'mono' : 'small';
  const frame = wide
    ? {
        height: 44,
        gap: space(6),
        paddingHorizontal: gutter.wide,
        backgroundColor: colours.clothSunk,
        borderTopWidth: 1,
        borderBottomWidth: 1,
        borderColor: colours.rule,
      }
    : { flexWrap: 'wrap' as const, columnGap: space(4), rowGap: space(1), paddingTop: space(2), paddingBottom: space(3) };
  return (
    <View style={[{ flexDirection: 'row', alignItems: 'center' }, frame]}>
      <StateBadge state={state} small={!wide} />
      {state === 'closed' ? null : (
        <Text variant={variant} tone="inkFaint" style={{ lineHeight: 20 }}>
          open {ageOf(openedAt, now)}
        </Text>
      )}
      <Text variant={variant} tone="inkFaint" style={{ lineHeight: 20 }}>
        {assignee ? `with ${assignee.name}` : 'with nobody yet'}
      </Text>
      {wide && state !== 'closed' ? (
        <Text variant="mono" tone="inkFaint" style={{ marginLeft: 'auto' }}>
          closes with a physicist’s signature
        </Text>
      ) : null}
    </View>
  );
}
