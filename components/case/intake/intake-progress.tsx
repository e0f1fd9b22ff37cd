/** How far the sending is, in one line, with the ways to stop it for a while or for good. */
import { View } from 'react-native';
import { LinkText } from '@/components/ui/link-text';
import { Notice } from '@/components/ui/notice';
import { ProgressThread } from '@/components/ui/progress-thread';
import { space } from '@/components/ui/theme';
import type { Intake, IntakeProgress as Progress } from './use-intake';

export function progressSentence({ settled, count, state }: Progress): string {
  if (count === 1) return 'taking the image in';
  return `${Math.floor(settled)} of ${count} slices${state === 'paused' ? ', paused' : ''}`;
}

export function IntakeProgress({ intake: { progress, pause, resume, cancel } }: { intake: Intake }) {
  if (progress === null) return null;
  const { settled, count, state } = progress;
  return (
    <View style={{ gap: space(2) }}>
      <ProgressThread done={settled / count} sentence={progressSentence(progress)} />
      {state === 'waiting' ? (
        <Notice kind="waiting" text="The connection is lost. What has arrived is kept; it goes on by itself once the network is back." />
      ) : null}
      {count > 1 ? (
        <View style={{ flexDirection: 'row', gap: space(4), marginVertical: -space(2) }}>
          {state === 'paused' ? <LinkText label="go on" onPress={resume} /> : <LinkText label="pause" onPress={pause} />}
          <LinkText label="cancel" name="cancel the upload" onPress={cancel} />
        </View>
      ) : null}
    </View>
  );
}
