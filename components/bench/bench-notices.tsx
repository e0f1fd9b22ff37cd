/** What happened, one line each, where it happened: a trial kept, a pane behind its recipe, a recipe that the server refused. */
import { View } from 'react-native';
import { LinkText } from '@/components/ui/link-text';
import { Notice } from '@/components/ui/notice';
import { space } from '@/components/ui/theme';
import { useBench } from './bench-context';
import type { Keep } from './use-keep-as-trial';

interface BenchNoticesProps {
  keep: Keep;
  /** A kept trial is told here; elsewhere the line of numbers tells it. */
  withKept?: boolean;
}

export function BenchNotices({ keep, withKept = false }: BenchNoticesProps) {
  const { kase, simulation, issues } = useBench();
  const { error, isBehind, retry } = simulation;
  const atControls = issues.atControl.size > 0;
  const messages = error === null ? [] : issues.elsewhere.length > 0 ? issues.elsewhere : atControls ? [] : [error.message];
  if (messages.length === 0 && !keep.error && !(withKept && keep.kept) && !(isBehind && error)) return null;
  return (
    <View style={{ gap: space(1), padding: space(2) }}>
      {messages.map((message) => (
        <Notice key={message} kind="failed" text={message} action={<LinkText label="again" onPress={retry} />} />
      ))}
      {isBehind && error ? <Notice kind="stale" text="this pane shows an older recipe" /> : null}
      {keep.error ? <Notice kind="failed" text={`not kept: ${keep.error.message}`} /> : null}
      {withKept && keep.kept ? (
        <Notice
          kind="done"
          text={`kept as trial ${keep.kept.number}`}
          action={<LinkText label="to the case" href={`/cases/${kase.id}`} />}
        />
      ) : null}
    </View>
  );
}
