/** An address that leads nowhere. */
import { View } from 'react-native';
import { Button } from '@/components/ui/button';
import { Screen } from '@/components/ui/screen';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';

export function NotFound() {
  return (
    <Screen title="Nothing here">
      <View style={{ maxWidth: 480, padding: space(6), gap: space(3), alignItems: 'flex-start' }}>
        <Text variant="title" level={1}>
          Nothing here
        </Text>
        <Text tone="inkSoft">This address leads nowhere. It may be mistyped, or belong to another department.</Text>
        <Button label="to the cases" kind="first" href="/cases" />
      </View>
    </Screen>
  );
}
