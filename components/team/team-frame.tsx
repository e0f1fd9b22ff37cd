/** The frame of everything behind the door: asks who is there, shows the door to nobody, and puts rail or foot around the rest. */
import { Redirect, usePathname } from 'expo-router';
import type { ReactNode } from 'react';
import { View } from 'react-native';
import { useSession } from '@/components/api/session';
import { LoadingWarp } from '@/components/ui/loading-warp';
import { ProblemNotice } from '@/components/ui/problem-notice';
import { useTheme } from '@/components/ui/theme-context';
import { useLayout } from '@/components/ui/use-layout';
import { Foot } from './foot';
import { hasFoot } from './places';
import { Rail } from './rail';
import { TextQuestionDialog } from './text-question-dialog';

export function TeamFrame({ children }: { children: ReactNode }) {
  const { colours } = useTheme();
  const pathname = usePathname();
  const wide = useLayout() === 'wide';
  const session = useSession();
  if (session.data === null) return <Redirect href={{ pathname: '/sign-in', params: { then: pathname } }} />;
  const waiting = session.isError ? (
    <ProblemNotice error={session.error} onRetry={() => void session.refetch()} />
  ) : (
    <LoadingWarp what="asking who is signed in" rows={3} />
  );
  return (
    <View style={{ flex: 1, flexDirection: wide ? 'row' : 'column', backgroundColor: colours.cloth }}>
      {wide ? <Rail pathname={pathname} /> : null}
      <View style={{ flex: 1, minWidth: 0, minHeight: 0 }}>{session.data ? children : waiting}</View>
      {!wide && hasFoot(pathname) ? <Foot pathname={pathname} /> : null}
      <TextQuestionDialog />
    </View>
  );
}
