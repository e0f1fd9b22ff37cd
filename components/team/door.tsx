/** The door: the mark, the name, what the product is for, the form. */
import { View } from 'react-native';
import { Mark } from '@/components/ui/mark';
import { Rule } from '@/components/ui/rule';
import { Screen } from '@/components/ui/screen';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import { useLayout } from '@/components/ui/use-layout';
import { SignInForm } from './sign-in-form';

export function Door({ then }: { then?: string | undefined }) {
  const { colours } = useTheme();
  const phone = useLayout() === 'phone';
  return (
    <Screen title="Sign in">
      <View
        style={{
          flexGrow: 1,
          width: '100%',
          maxWidth: 390,
          alignSelf: 'center',
          paddingHorizontal: space(6),
          paddingTop: phone ? 96 : 144,
        }}
      >
        <Mark size={72} colour={colours.ink} />
        <Text variant="display" level={1} style={{ paddingTop: 26 }}>
          Pickglass
        </Text>
        <Text tone="inkSoft">{'Find the fault, prove it,\nwrite down what fixed it.'}</Text>
        <View style={{ paddingTop: space(12) }}>
          <SignInForm then={then} />
        </View>
        <View style={{ marginTop: 'auto', paddingTop: space(8), paddingBottom: space(6) }}>
          <Rule />
          <Text variant="small" tone="inkFaint" style={{ paddingTop: space(4), paddingBottom: space(1) }}>
            for members of the department
          </Text>
          <Text variant="detail" tone="inkSoft">
            No patient’s identity is stored here.
          </Text>
        </View>
      </View>
    </Screen>
  );
}
