/** A case on a wide screen: the argument in the main column, facts, trail and talk in the aside. */
import { ScrollView, View } from 'react-native';
import { Button } from '@/components/ui/button';
import { GlyphButton } from '@/components/ui/glyph-button';
import { Notice } from '@/components/ui/notice';
import { Screen } from '@/components/ui/screen';
import { Text } from '@/components/ui/text';
import { fonts, gutter, space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { Case } from '@/server/contract/cases';
import { caseNumber } from '../words';
import { actionsOf } from './case-actions';
import { CaseStrip } from './case-strip';
import { DiscussionSection } from './discussion-section';
import { EditableSummary } from './editable-summary';
import { FindingSection } from './finding-section';
import { ImagesSection } from './images-section';
import { TimelineSection } from './timeline-section';
import { TrialsSection } from './trials-section';
import type { useCaseSteps } from './use-case-steps';

interface CaseWideProps {
  found: Case;
  steps: ReturnType<typeof useCaseSteps>;
}

function CaseHead({ found, steps }: CaseWideProps) {
  const { first, others } = actionsOf(found);
  const working = steps.move.isPending;
  return (
    <View style={{ height: 72, flexDirection: 'row', alignItems: 'center', gap: space(3), paddingHorizontal: gutter.wide }}>
      <View style={{ marginLeft: -14 }}>
        <GlyphButton glyph="left" label="to the cases" href="/cases" />
      </View>
      <Text variant="title" tone="inkFaint" style={{ fontFamily: fonts.mono }}>
        {caseNumber(found.number)}
      </Text>
      <Text variant="title" level={1} numberOfLines={1} style={{ flex: 1 }}>
        {found.title}
      </Text>
      {[...others].reverse().map(({ id, label }) => (
        <Button
          key={id}
          label={label}
          kind={id === 'return' || id === 'assign' ? 'plain' : 'quiet'}
          disabled={working}
          onPress={() => steps.take(id)}
        />
      ))}
      <Button
        label={first.label}
        kind="first"
        busy={working}
        disabled={first.id === 'bench' && found.images.length === 0}
        onPress={() => steps.take(first.id)}
      />
    </View>
  );
}

export function CaseWide({ found, steps }: CaseWideProps) {
  const { colours } = useTheme();
  return (
    <Screen title={`${caseNumber(found.number)} ${found.title}`} still head={<CaseHead found={found} steps={steps} />}>
      <CaseStrip found={found} wide />
      <ScrollView style={{ flex: 1 }} contentContainerStyle={{ flexGrow: 1, flexDirection: 'row' }}>
        <View style={{ flex: 1, minWidth: 0, paddingLeft: gutter.wide, paddingRight: 40, paddingBottom: space(8) }}>
          {steps.move.error && steps.asked === null ? (
            <View style={{ paddingTop: space(4) }}>
              <Notice kind="failed" text={steps.move.error.message} />
            </View>
          ) : null}
          <FindingSection found={found} />
          <ImagesSection found={found} bleed={{ left: gutter.wide, right: 40 }} />
          <TrialsSection caseId={found.id} wide />
        </View>
        <View
          role="complementary"
          style={{
            width: 400,
            borderLeftWidth: 1,
            borderLeftColor: colours.rule,
            paddingLeft: space(8),
            paddingRight: gutter.wide,
            paddingBottom: space(8),
          }}
        >
          <EditableSummary found={found} />
          <TimelineSection caseId={found.id} openedAt={found.openedAt} />
          <DiscussionSection caseId={found.id} openedAt={found.openedAt} open={found.may.edit} />
        </View>
      </ScrollView>
    </Screen>
  );
}
