/** The inbox of a scanner: what it sent and nobody has taken yet, the newest series first. */
import { View } from 'react-native';
import { useInbox } from '@/components/api/push';
import { EmptyState } from '@/components/ui/empty-state';
import { LoadingWarp } from '@/components/ui/loading-warp';
import { ProblemNotice } from '@/components/ui/problem-notice';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { InboxSeries } from './inbox-series';

export function Inbox({ scanner }: { scanner: { id: string; name: string } }) {
  const { data, error, refetch } = useInbox(scanner.id);
  const waits = data === undefined ? '' : data.total === 1 ? '1 image waits' : `${data.total} images wait`;
  return (
    <View role="region" aria-label="inbox" style={{ gap: space(1) }}>
      <View style={{ flexDirection: 'row', alignItems: 'baseline', gap: space(3) }}>
        <Text variant="heading" level={2}>
          Inbox
        </Text>
        <Text variant="small" tone="inkFaint">
          {waits}
        </Text>
      </View>
      {error ? <ProblemNotice error={error} onRetry={() => void refetch()} /> : null}
      {!data && !error ? <LoadingWarp what="fetching the inbox" /> : null}
      {data ? (
        <Text variant="small" tone="inkSoft">
          {`Without names. What nobody takes is deleted after ${data.keptDays} ${data.keptDays === 1 ? 'day' : 'days'}, unless a case has part of its series.`}
        </Text>
      ) : null}
      {data?.total === 0 ? <EmptyState text="Nothing waits. What this scanner sends comes here." /> : null}
      {data?.series.map(({ images }) => (
        <InboxSeries key={images[0]?.id} scanner={scanner} images={images} />
      ))}
    </View>
  );
}
