/** The keys of the table, and whose cases these are. */
import { View } from 'react-native';
import { useSession } from '@/components/api/session';
import { KeyHint } from '@/components/ui/key-hint';
import { Text } from '@/components/ui/text';
import { gutter, space, touchTarget } from '@/components/ui/theme';

export function KeyFoot() {
  const session = useSession();
  return (
    <View style={{ height: touchTarget, flexDirection: 'row', alignItems: 'center', gap: space(5), paddingHorizontal: gutter.wide }}>
      <KeyHint keys="↑ ↓" does="choose" />
      <KeyHint keys="↵" does="open" />
      <KeyHint keys="b" does="bench" />
      <KeyHint keys="n" does="new case" />
      <Text variant="small" tone="inkFaint" style={{ marginLeft: 'auto' }}>
        {session.data?.department.name ?? ''}
      </Text>
    </View>
  );
}
