/** How a scanner may send: its AE title and addresses. A lead technologist or an administrator changes them, everybody sees them. */
import { useState } from 'react';
import { View } from 'react-native';
import { useChangePush } from '@/components/api/push';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { Text } from '@/components/ui/text';
import { TextField } from '@/components/ui/text-field';
import { space } from '@/components/ui/theme';
import { ApiProblem } from '@/components/api/api-problem';
import type { ScannerPush } from '@/server/contract/push';
import { FactLine } from './fact-line';

/** Addresses as somebody types them: separated by spaces, commas or lines. */
export const addressesIn = (text: string): string[] => text.split(/[\s,;]+/).filter((address) => address !== '');

export function PushSettings({ scannerId, push }: { scannerId: string; push: ScannerPush }) {
  const [open, setOpen] = useState(false);
  if (open) return <SettingsForm scannerId={scannerId} push={push} onDone={() => setOpen(false)} />;
  return (
    <View>
      <FactLine name="AE title" value={push.aeTitle ?? 'not set: it may not send'} />
      <FactLine name="from" value={push.addresses.join(', ') || 'nowhere'} />
      {push.mayChange ? <Button label="change" kind="plain" style={{ alignSelf: 'flex-start' }} onPress={() => setOpen(true)} /> : null}
    </View>
  );
}

const messageAt = (error: Error | null, field: string): string | undefined =>
  error instanceof ApiProblem ? error.issues.find(({ path }) => path[0] === field)?.message : undefined;

function SettingsForm({ scannerId, push, onDone }: { scannerId: string; push: ScannerPush; onDone: () => void }) {
  const [aeTitle, setAeTitle] = useState(push.aeTitle ?? '');
  const [addresses, setAddresses] = useState(push.addresses.join('\n'));
  const change = useChangePush(scannerId);
  const save = (): void => {
    const body = { aeTitle: aeTitle.trim() === '' ? null : aeTitle, addresses: addressesIn(addresses) };
    change.mutate(body, { onSuccess: onDone });
  };
  const [atTitle, atAddresses] = [messageAt(change.error, 'aeTitle'), messageAt(change.error, 'addresses')];
  return (
    <View role="form" aria-label="who may send" style={{ gap: space(3), paddingVertical: space(2) }}>
      <TextField label="AE title of the scanner" value={aeTitle} onChange={setAeTitle} maxLength={16} error={atTitle} />
      <TextField
        label="its addresses"
        value={addresses}
        onChange={setAddresses}
        lines={2}
        error={atAddresses}
        note="IP addresses or subnets, as 10.1.2.3 or 10.1.2.0/24"
      />
      {change.error && !atTitle && !atAddresses ? <Notice kind="failed" text={change.error.message} /> : null}
      <View style={{ flexDirection: 'row', gap: space(2) }}>
        <Button label="save" onPress={save} busy={change.isPending} />
        <Button label="leave it" kind="plain" onPress={onDone} />
      </View>
      <Text variant="small" tone="inkFaint">
        An empty title or no address: the scanner is not let in.
      </Text>
    </View>
  );
}
