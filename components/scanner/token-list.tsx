/** Tokens with which a scanner sends over the web (STOW-RS). A new one is shown once, at the moment it is drawn. */
import { View } from 'react-native';
import { useDrawToken, useRevokeToken } from '@/components/api/push';
import { agoOf } from '@/components/case/age';
import { useNow } from '@/components/case/use-now';
import { Button } from '@/components/ui/button';
import { LinkText } from '@/components/ui/link-text';
import { Notice } from '@/components/ui/notice';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { ScannerPush } from '@/server/contract/push';

export function TokenList({ scannerId, push }: { scannerId: string; push: ScannerPush }) {
  const { colours } = useTheme();
  const now = useNow();
  const draw = useDrawToken(scannerId);
  const revoke = useRevokeToken(scannerId);
  const error = draw.error ?? revoke.error;
  return (
    <View style={{ gap: space(1) }}>
      <Text variant="label">Tokens for the web</Text>
      {push.tokens.length === 0 ? (
        <Text variant="small" tone="inkFaint">
          none: it may not send over the web
        </Text>
      ) : null}
      {push.tokens.map((token) => (
        <View
          key={token.id}
          style={{ flexDirection: 'row', alignItems: 'center', gap: space(3), borderBottomWidth: 1, borderBottomColor: colours.rule }}
        >
          <Text variant="small" tone="inkSoft" style={{ flex: 1 }}>
            {`drawn ${agoOf(token.drawnAt, now)} by ${token.drawnBy}, ${token.lastUsedAt ? `used ${agoOf(token.lastUsedAt, now)}` : 'never used'}`}
          </Text>
          {push.mayChange ? <LinkText label="revoke" onPress={() => revoke.mutate(token.id)} /> : null}
        </View>
      ))}
      {draw.data ? (
        <View role="status" style={{ borderWidth: 1, borderColor: colours.ruleStrong, padding: space(3), gap: space(2) }}>
          <Text variant="mono" selectable>
            {draw.data.token}
          </Text>
          <Text variant="small" tone="weld">
            Copy it now: it is not kept and not shown again.
          </Text>
        </View>
      ) : null}
      {push.mayChange ? (
        <Button label="draw a token" kind="plain" style={{ alignSelf: 'flex-start' }} onPress={() => draw.mutate()} busy={draw.isPending} />
      ) : null}
      {error ? <Notice kind="failed" text={error.message} /> : null}
    </View>
  );
}
