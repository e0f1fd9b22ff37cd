/** The account: who is signed in, the theme, signing out. */
import { useRouter } from 'expo-router';
import { View } from 'react-native';
import { useSession, useSignOut } from '@/components/api/session';
import { Button } from '@/components/ui/button';
import { Choice } from '@/components/ui/choice';
import { LoadingWarp } from '@/components/ui/loading-warp';
import { Notice } from '@/components/ui/notice';
import { PageHead } from '@/components/ui/page-head';
import { Screen } from '@/components/ui/screen';
import { Text } from '@/components/ui/text';
import { gutter, space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { ThemePreference } from '@/components/ui/theme-preference';
import { useLayout } from '@/components/ui/use-layout';
import { roleWords } from '../case/words';

const themeOptions: readonly { value: ThemePreference; label: string }[] = [
  { value: 'light', label: 'linen, light' },
  { value: 'dark', label: 'cloth, dark' },
  { value: 'system', label: 'as the system' },
];

export function AccountScreen() {
  const router = useRouter();
  const { preference, choose } = useTheme();
  const wide = useLayout() === 'wide';
  const { data: session } = useSession();
  const signOut = useSignOut();
  const leave = (): void => signOut.mutate(undefined, { onSuccess: () => router.replace('/sign-in') });
  return (
    <Screen
      title="Account"
      head={
        <PageHead
          title="Account"
          end={<Button label="sign out" kind={wide ? 'quiet' : 'plain'} busy={signOut.isPending} onPress={leave} />}
        />
      }
    >
      {session ? (
        <View style={{ maxWidth: 560, paddingHorizontal: wide ? gutter.wide : gutter.phone, paddingTop: space(2), gap: space(8) }}>
          {signOut.error ? <Notice kind="failed" text={signOut.error.message} /> : null}
          <View>
            <Text variant="title" level={2}>
              {session.member.name}
            </Text>
            <Text variant="small" tone="inkSoft">
              {roleWords[session.member.role]} · {session.member.email}
            </Text>
            <Text variant="small" tone="inkFaint" style={{ paddingTop: space(1) }}>
              {session.department.name}
            </Text>
          </View>
          <View>
            <Choice label="Theme" columns={wide ? 3 : 1} options={themeOptions} value={preference} onChange={choose} />
            <Text variant="detail" tone="inkSoft" style={{ paddingTop: space(2) }}>
              {preference === null
                ? 'Not chosen: the system decides, and the bench is dark, because pictures are read against a dark surround.'
                : 'Kept in this browser, on the bench too.'}
            </Text>
          </View>
        </View>
      ) : (
        <LoadingWarp what="asking who is signed in" rows={2} />
      )}
    </Screen>
  );
}
