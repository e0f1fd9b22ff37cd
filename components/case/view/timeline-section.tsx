/** Who did what, when, newest first. Nobody can edit it. */
import { useTimeline } from '@/components/api/timeline';
import type { GlyphName } from '@/components/ui/glyph-paths';
import { LoadingWarp } from '@/components/ui/loading-warp';
import { ProblemNotice } from '@/components/ui/problem-notice';
import type { CaseEvent } from '@/server/contract/case-parts';
import { dayOf } from '../age';
import { stateWords } from '../words';
import { Section } from './section';
import { Trail } from './trail';

const glyphs: Record<CaseEvent['kind'], GlyphName> = {
  filed: 'reported',
  changed: 'note',
  'image-added': 'image',
  'fact-set': 'step',
  'trial-kept': 'simulated',
  'mark-added': 'mark',
  'mark-removed': 'mark',
  commented: 'note',
  'finding-written': 'note',
  assigned: 'right',
  'state-changed': 'right',
  signed: 'verified',
};

const bare: Record<CaseEvent['kind'], string> = {
  filed: 'filed',
  changed: 'changed',
  'image-added': 'image added',
  'fact-set': 'scan fact set',
  'trial-kept': 'trial kept',
  'mark-added': 'mark added',
  'mark-removed': 'mark removed',
  commented: 'wrote a note',
  'finding-written': 'finding written',
  assigned: 'assigned',
  'state-changed': 'moved on',
  signed: 'signed',
};

/** A digest is 64 digits: on the trail its beginning is enough to compare by eye. */
const shortDigest = (text: string): string => text.replace(/\b([0-9a-f]{12})[0-9a-f]{52}\b/, '$1…');

export function sentenceOf({ kind, from, to, text }: CaseEvent): string {
  const said = shortDigest(text);
  if (kind === 'state-changed' && from && to) return `${stateWords[from]} → ${stateWords[to]}${said ? `: ${said}` : ''}`;
  return said || bare[kind];
}

interface TimelineSectionProps {
  caseId: string;
  openedAt: string;
}

export function TimelineSection({ caseId, openedAt }: TimelineSectionProps) {
  const { data, error, refetch } = useTimeline(caseId);
  return (
    <Section title="Timeline">
      {error ? <ProblemNotice error={error} onRetry={() => void refetch()} /> : null}
      {!data && !error ? <LoadingWarp what="fetching the timeline" rows={3} picture={16} /> : null}
      {data ? (
        <Trail
          label="timeline, newest first"
          knots={data.map((event) => ({
            id: event.id,
            glyph: event.kind === 'state-changed' && event.to ? event.to : glyphs[event.kind],
            when: `${dayOf(event.at, openedAt)} · ${event.actor.name}`,
            text: sentenceOf(event),
          }))}
        />
      ) : null}
    </Section>
  );
}
