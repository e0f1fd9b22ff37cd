/** A case on a phone and a tablet: tabs; the first one is the whole story, the others are its parts alone. */
import { useState } from 'react';
import { ScrollView, View } from 'react-native';
import { useComments } from '@/components/api/comments';
import { ActionBar } from '@/components/ui/action-bar';
import { BarHead } from '@/components/ui/bar-head';
import { Button } from '@/components/ui/button';
import { GlyphMenu } from '@/components/ui/glyph-menu';
import { Notice } from '@/components/ui/notice';
import { Screen } from '@/components/ui/screen';
import { Tabs } from '@/components/ui/tabs';
import { Text } from '@/components/ui/text';
import { gutter } from '@/components/ui/theme';
import type { Case } from '@/server/contract/cases';
import { caseNumber } from '../words';
import { actionsOf, type CaseAction } from './case-actions';
import { CaseStrip } from './case-strip';
import { DiscussionSection } from './discussion-section';
import { EditableSummary } from './editable-summary';
import { FindingSection } from './finding-section';
import { ImagesMat } from './images-mat';
import { ImagesSection } from './images-section';
import { TimelineSection } from './timeline-section';
import { TrialsSection } from './trials-section';
import type { useCaseSteps } from './use-case-steps';

type Part = 'case' | 'images' | 'trials' | 'talk' | 'history';

interface CasePhoneProps {
  found: Case;
  steps: ReturnType<typeof useCaseSteps>;
}

export function CasePhone({ found, steps }: CasePhoneProps) {
  const [part, setPart] = useState<Part>('case');
  const comments = useComments(found.id);
  const { first, others } = actionsOf(found);
  const [second, ...rest] = others;
  const firstBad = found.images.find(({ role }) => role === 'bad') ?? found.images[0];
  const edges = { left: gutter.phone, right: gutter.phone };
  const more: readonly CaseAction[] = rest;
  return (
    <Screen
      title={`${caseNumber(found.number)} ${found.title}`}
      still
      head={
        <>
          <BarHead
            back="/cases"
            backLabel="to the cases"
            title={caseNumber(found.number)}
            faint
            end={more.length > 0 ? <GlyphMenu glyph="more" label="more" rows={more} onChoose={(id) => steps.take(id)} /> : null}
          />
          <View style={{ paddingHorizontal: gutter.phone }}>
            <Text variant="title" level={1}>
              {found.title}
            </Text>
            <CaseStrip found={found} wide={false} />
          </View>
          <Tabs
            label="parts of the case"
            even
            value={part}
            onChange={setPart}
            tabs={[
              { value: 'case', label: 'case' },
              { value: 'images', label: 'images' },
              { value: 'trials', label: 'trials' },
              { value: 'talk', label: 'talk', count: comments.data?.length || undefined },
              { value: 'history', label: 'history' },
            ]}
          />
        </>
      }
      actions={
        <ActionBar>
          {second ? <Button label={second.label} small onPress={() => steps.take(second.id)} busy={steps.move.isPending} grow /> : null}
          <Button
            label={first.label}
            kind="first"
            grow
            onPress={() => steps.take(first.id)}
            busy={steps.move.isPending}
            disabled={first.id === 'bench' && found.images.length === 0}
          />
        </ActionBar>
      }
    >
      <ScrollView style={{ flex: 1 }}>
        {steps.move.error && steps.asked === null ? (
          <View style={{ padding: gutter.phone }}>
            <Notice kind="failed" text={steps.move.error.message} />
          </View>
        ) : null}
        {part === 'case' && firstBad ? <ImagesMat images={[firstBad]} /> : null}
        <View style={{ paddingHorizontal: gutter.phone, paddingBottom: gutter.wide }}>
          {part === 'case' ? <FindingSection found={found} /> : null}
          {part === 'images' ? <ImagesSection found={found} bleed={edges} /> : null}
          {part === 'case' || part === 'trials' ? <TrialsSection caseId={found.id} wide={false} /> : null}
          {part === 'case' ? <EditableSummary found={found} /> : null}
          {part === 'talk' ? <DiscussionSection caseId={found.id} openedAt={found.openedAt} open={found.may.edit} /> : null}
          {part === 'case' || part === 'history' ? <TimelineSection caseId={found.id} openedAt={found.openedAt} /> : null}
        </View>
      </ScrollView>
    </Screen>
  );
}
