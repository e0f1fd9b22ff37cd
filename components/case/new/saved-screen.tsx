/** Filed: the number to type into the exam's note, and what a technologist may change while the patient is still there. */
import { useState } from 'react';
import { View } from 'react-native';
import { useCase } from '@/components/api/cases';
import { useCauses } from '@/components/api/catalogue';
import { Deference } from '@/components/cause/deference';
import { fittingCauses } from '@/components/cause/fitting-causes';
import { RemedyList } from '@/components/cause/remedy-list';
import { ActionBar } from '@/components/ui/action-bar';
import { BarHead } from '@/components/ui/bar-head';
import { Button } from '@/components/ui/button';
import { LoadingWarp } from '@/components/ui/loading-warp';
import { ProblemNotice } from '@/components/ui/problem-notice';
import { Screen } from '@/components/ui/screen';
import { Text } from '@/components/ui/text';
import { gutter, space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { Case } from '@/server/contract/cases';
import { caseNumber } from '../words';

function BigNumber({ filed }: { filed: Case }) {
  const { colours } = useTheme();
  const [copied, setCopied] = useState<'yes' | 'no' | null>(null);
  const number = caseNumber(filed.number);
  const copy = (): void => {
    navigator.clipboard.writeText(number).then(
      () => setCopied('yes'),
      () => setCopied('no'),
    );
  };
  return (
    <View
      style={{
        paddingHorizontal: gutter.phone,
        paddingVertical: space(3),
        backgroundColor: colours.clothRaised,
        borderTopWidth: 1,
        borderBottomWidth: 1,
        borderColor: colours.rule,
      }}
    >
      <Text variant="small" tone="inkSoft">
        type this into the exam’s note
      </Text>
      <View style={{ flexDirection: 'row', alignItems: 'center', justifyContent: 'space-between' }}>
        <Text variant="display" level={1} style={{ fontSize: 44, lineHeight: 52, letterSpacing: 0.9 }}>
          {number}
        </Text>
        <Button label={copied === 'yes' ? 'copied' : 'copy'} onPress={copy} />
      </View>
      {copied === 'no' ? (
        <Text variant="small" tone="inkSoft" role="status">
          The browser does not allow copying here: type it.
        </Text>
      ) : null}
    </View>
  );
}

function ChangeNow({ seen }: { seen: Case['seen'] }) {
  const causes = useCauses();
  if (causes.error) return <ProblemNotice error={causes.error} onRetry={() => void causes.refetch()} />;
  if (!causes.data) return <LoadingWarp what="fetching the catalogue" rows={3} />;
  const atHand = fittingCauses(causes.data, seen)
    .map((cause) => ({ ...cause, remedies: cause.remedies.filter((remedy) => remedy.who === 'technologist') }))
    .filter((cause) => cause.remedies.length > 0);
  return (
    <View style={{ paddingHorizontal: gutter.phone, paddingTop: 14, paddingBottom: space(6) }}>
      <Text variant="heading" level={2}>
        What I can change now
      </Text>
      <Text variant="detail" tone="inkSoft" style={{ paddingTop: space(1) }}>
        Nothing is fitted yet. These causes can look like what was seen; this is what a technologist may change.
      </Text>
      {atHand.map((cause) => (
        <View key={cause.id} style={{ paddingTop: space(5) }}>
          <Text variant="label" level={3}>
            {cause.title}
          </Text>
          <Text variant="detail" tone="inkSoft">
            {cause.looks.image}
          </Text>
          <RemedyList name={`what I can change now: ${cause.title}`} remedies={cause.remedies} />
        </View>
      ))}
      <Deference />
    </View>
  );
}

export function SavedScreen({ caseId }: { caseId: string }) {
  const { data: filed, error, refetch } = useCase(caseId);
  return (
    <Screen
      title="Saved"
      head={<BarHead back="/cases" backLabel="to the cases" title="Saved" />}
      actions={
        <ActionBar>
          <Button label="another case" href="/cases/new" />
          <Button label="open the case" kind="first" grow href={{ pathname: '/cases/[caseId]', params: { caseId } }} />
        </ActionBar>
      }
    >
      {filed ? (
        <BigNumber filed={filed} />
      ) : error ? (
        <ProblemNotice error={error} onRetry={() => void refetch()} />
      ) : (
        <LoadingWarp what="fetching the case" rows={1} />
      )}
      <View style={{ width: '100%', maxWidth: 720 }}>{filed ? <ChangeNow seen={filed.seen} /> : null}</View>
    </Screen>
  );
}
