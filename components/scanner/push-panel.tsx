/** What the scanner's page says of push: what to set at the scanner, what came and what was refused, and who may send. */
import { View } from 'react-native';
import { usePush } from '@/components/api/push';
import { agoOf } from '@/components/case/age';
import { useNow } from '@/components/case/use-now';
import { LoadingWarp } from '@/components/ui/loading-warp';
import { ProblemNotice } from '@/components/ui/problem-notice';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import type { ScannerPush } from '@/server/contract/push';
import { FactLine } from './fact-line';
import { refusalWords } from './inbox-words';
import { PushSettings } from './push-settings';
import { TokenList } from './token-list';

function nodeWords(node: ScannerPush['node']): string {
  if (node === null) return 'off: the administrator of the server switches it on';
  const reach = node.loopback ? ', from this machine only' : '';
  return `listens as ${node.aeTitle}${node.port === 0 ? '' : `, port ${node.port}`}${reach}`;
}

export function PushPanel({ scannerId }: { scannerId: string }) {
  const now = useNow();
  const { data: push, error, refetch } = usePush(scannerId);
  if (error) return <ProblemNotice error={error} onRetry={() => void refetch()} />;
  if (push === undefined) return <LoadingWarp what="fetching how it sends" />;
  const { received, refused } = push;
  const ago = (at: string | null): string => (at === null ? 'never' : agoOf(at, now));
  return (
    <View role="region" aria-label="push from the scanner" style={{ gap: space(3) }}>
      <View>
        <Text variant="heading" level={2}>
          Push from the scanner
        </Text>
        <FactLine name="DICOM node" value={nodeWords(push.node)} />
        <FactLine name="last sent" value={ago(received.lastAt)} />
        <FactLine name="images" value={String(received.count)} />
        <FactLine name="refused" value={refused.last === null ? '0' : `${refused.count}, last ${ago(refused.lastAt)}`} />
        {refused.last === null ? null : (
          <Text variant="small" tone="weld" style={{ paddingTop: space(1) }}>
            {refusalWords(refused.last)}
          </Text>
        )}
      </View>
      <PushSettings scannerId={scannerId} push={push} />
      <TokenList scannerId={scannerId} push={push} />
    </View>
  );
}
