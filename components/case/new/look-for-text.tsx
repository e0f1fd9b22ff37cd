/** A secondary capture, large enough to read: it goes on no case before whoever sent it has looked for a name in it. */
import { View } from 'react-native';
import { useConfirmNoText, useDiscardImage } from '@/components/api/captures';
import { thumbnailOf } from '@/components/api/images';
import { LinkText } from '@/components/ui/link-text';
import { Notice } from '@/components/ui/notice';
import { Picture } from '@/components/ui/picture';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';

interface LookForTextProps {
  imageId: string;
  /** The image was taken away. */
  onGone: () => void;
}

/** As large as a small picture is made. */
const side = 192;

export function LookForText({ imageId, onGone }: LookForTextProps) {
  const confirm = useConfirmNoText(imageId);
  const discard = useDiscardImage(imageId);
  const failure = confirm.error ?? discard.error;
  return (
    <View style={{ gap: space(2), paddingTop: space(3) }}>
      <Notice kind="waiting" text="A picture of a screen may show a name. Look at it first; until then nobody else sees it." />
      <Picture source={thumbnailOf(imageId)} alt="the secondary capture to look at" size={side} />
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', columnGap: space(4) }}>
        <LinkText label="it shows no name and no text" onPress={() => confirm.mutate()} />
        <LinkText label="it shows some: take it away" onPress={() => discard.mutate(undefined, { onSuccess: onGone })} />
      </View>
      <Text variant="small" tone="inkFaint">
        Fine print is not legible at this size: where in doubt, take it away and send the image itself.
      </Text>
      {failure ? <Notice kind="failed" text={failure.message} /> : null}
    </View>
  );
}
