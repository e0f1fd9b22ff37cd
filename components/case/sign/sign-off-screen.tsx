/** Signing a case off. Two columns on a wide screen: what is attested, and what it rests on; one column on a phone. */
import { ScrollView, View } from 'react-native';
import { useCase } from '@/components/api/cases';
import { useCauses } from '@/components/api/catalogue';
import { useSession } from '@/components/api/session';
import { useTrials } from '@/components/api/trials';
import { ActionBar } from '@/components/ui/action-bar';
import { BarHead } from '@/components/ui/bar-head';
import { Button } from '@/components/ui/button';
import { LoadingWarp } from '@/components/ui/loading-warp';
import { Notice } from '@/components/ui/notice';
import { ProblemNotice } from '@/components/ui/problem-notice';
import { Screen } from '@/components/ui/screen';
import { Text } from '@/components/ui/text';
import { gutter, space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import { useLayout } from '@/components/ui/use-layout';
import type { Trial } from '@/server/contract/case-parts';
import type { Case } from '@/server/contract/cases';
import type { Member } from '@/server/contract/session';
import { caseNumber, confidenceWords, roleWords } from '../words';
import { attestLines, nearestTrial } from './attest-lines';
import { AttestPart } from './attest-part';
import { ConfirmPart } from './confirm-part';
import { EvidenceMat } from './evidence-mat';
import { SignOffHead } from './sign-off-head';
import { useSignOff } from './use-sign-off';

interface SignOffProps {
  found: Case;
  trials: readonly Trial[];
  causeTitle: string | null;
  member: Member;
}

function SignOff({ found, trials, causeTitle, member }: SignOffProps) {
  const { colours } = useTheme();
  const wide = useLayout() === 'wide';
  const lines = attestLines(found, trials, causeTitle);
  const form = useSignOff(found, lines);
  const attest = <AttestPart form={form} lines={lines} causeFound={causeTitle !== null} />;
  const button = (label: string) => (
    <Button
      label={label}
      kind="first"
      tall
      grow
      busy={form.busy}
      disabled={form.fault !== null}
      hint={form.fault ? `waits for the case number: ${form.fault}` : ''}
      onPress={form.sign}
    />
  );
  if (wide) {
    return (
      <Screen title={`Sign off ${caseNumber(found.number)}`} still head={<SignOffHead found={found} />}>
        <View style={{ flex: 1, flexDirection: 'row', borderTopWidth: 1, borderTopColor: colours.rule }}>
          <ScrollView
            style={{ flex: 1 }}
            contentContainerStyle={{ paddingHorizontal: gutter.wide, paddingRight: 40, paddingBottom: space(8) }}
          >
            {attest}
          </ScrollView>
          <View style={{ width: 1, backgroundColor: colours.rule }} />
          <ScrollView style={{ flex: 1.2 }} contentContainerStyle={{ paddingBottom: space(8) }}>
            <EvidenceMat found={found} trial={nearestTrial(trials)} />
            <View style={{ paddingHorizontal: gutter.wide }}>
              <ConfirmPart
                form={form}
                signer={`${member.name}, ${roleWords[member.role]}`}
                button={button(`sign off as ${member.name}, ${roleWords[member.role]}`)}
              />
            </View>
          </ScrollView>
        </View>
      </Screen>
    );
  }
  const back = { pathname: '/cases/[caseId]', params: { caseId: found.id } } as const;
  return (
    <Screen
      title={`Sign off ${caseNumber(found.number)}`}
      head={
        <BarHead
          back={back}
          backLabel="to the case"
          title="Sign off"
          end={
            <Text variant="small" tone="inkFaint" style={{ paddingRight: space(3) }}>
              {caseNumber(found.number)}
            </Text>
          }
        />
      }
      actions={
        <ActionBar>
          <Button label="not yet" small href={back} />
          {button('sign off')}
        </ActionBar>
      }
    >
      <View style={{ paddingHorizontal: gutter.phone, paddingBottom: space(6) }}>
        <Text variant="title" level={1}>
          {found.title}
        </Text>
        <Text variant="small" tone="inkSoft" style={{ paddingTop: space(1) }}>
          {[causeTitle ?? 'cause not found', found.finding ? confidenceWords[found.finding.confidence] : ''].filter(Boolean).join(' · ')}
        </Text>
        {attest}
        <ConfirmPart form={form} signer={`${member.name}, ${roleWords[member.role]}`} />
      </View>
    </Screen>
  );
}

export function SignOffScreen({ caseId }: { caseId: string }) {
  const found = useCase(caseId);
  const trials = useTrials(caseId);
  const causes = useCauses();
  const session = useSession();
  const error = found.error ?? trials.error ?? causes.error;
  if (found.data && trials.data && causes.data && session.data && found.data.may.transitions.includes('sign-off')) {
    const { cause = null } = found.data.finding ?? {};
    const title = causes.data.find(({ id }) => id === cause)?.title ?? cause;
    return <SignOff found={found.data} trials={trials.data} causeTitle={title} member={session.data.member} />;
  }
  return (
    <Screen
      title="Sign off"
      head={<BarHead back={{ pathname: '/cases/[caseId]', params: { caseId } }} backLabel="to the case" title="Sign off" level={1} />}
    >
      {error ? (
        <ProblemNotice error={error} onRetry={() => void Promise.all([found.refetch(), trials.refetch(), causes.refetch()])} />
      ) : null}
      {!error && !found.data ? <LoadingWarp what="fetching the case" /> : null}
      {found.data && !found.data.may.transitions.includes('sign-off') ? (
        <View style={{ padding: gutter.phone }}>
          <Notice
            kind="waiting"
            text="This case cannot be signed off now: it must await sign-off, with a finding, and a physicist signs."
          />
        </View>
      ) : null}
    </Screen>
  );
}
