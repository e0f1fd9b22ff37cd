/** The series around an image of a case: is it on the other slices? Any of them can be put on the case beside it. */
import { useState } from 'react';
import { View } from 'react-native';
import { useAttachImage } from '@/components/api/cases';
import { frameThumbnailOf } from '@/components/api/frames';
import { useSlices } from '@/components/api/series';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { Picture } from '@/components/ui/picture';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import type { Case } from '@/server/contract/cases';
import type { Slice } from '@/server/contract/series';
import { SliceStrip } from '../intake/slice-strip';

interface NeighboursProps {
  found: Case;
  /** The image whose series is looked along. */
  image: Case['images'][number];
  onClose: () => void;
}

const lookedAtSize = 204;

export function Neighbours({ found, image: { imageId, role }, onClose }: NeighboursProps) {
  const attach = useAttachImage(found.id);
  const { data: slices = [] } = useSlices(imageId);
  const [picked, setPicked] = useState<Slice | null>(null);
  const place = Math.max(0, picked ? slices.indexOf(picked) : slices.findIndex((slice) => slice.imageId === imageId));
  const shown = slices[place];
  if (shown === undefined) return null;
  const isOnCase = found.images.some((image) => image.imageId === shown.imageId);
  const where = `slice ${place + 1} of ${slices.length}`;
  return (
    <View style={{ paddingTop: space(4), gap: space(2) }}>
      <Text variant="detailStrong" tone="matInk" level={3}>
        Is it on the other slices?
      </Text>
      <SliceStrip
        label="slices of the series"
        many={false}
        slices={slices}
        chosen={(slice) => slice === shown}
        onPress={setPicked}
        tone="matInkSoft"
      />
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space(3) }}>
        <Picture source={frameThumbnailOf(shown.imageId, shown.frame)} alt={where} size={lookedAtSize} mat={0} />
        <View style={{ gap: space(2), alignItems: 'flex-start', justifyContent: 'flex-end', flexGrow: 1 }}>
          <Text variant="small" tone="matInk">
            {where}
            {shown.positionMm === null ? '' : `, at ${shown.positionMm.toFixed(1)} mm`}
            {isOnCase ? ', on the case' : ''}
          </Text>
          {found.may.edit && !isOnCase ? (
            <Button
              label="put this slice on the case"
              busy={attach.isPending}
              onPress={() => attach.mutate({ imageId: shown.imageId, role })}
            />
          ) : null}
          {attach.error ? <Notice kind="failed" text={attach.error.message} /> : null}
          <Button label="close the series" kind="plain" onPress={onClose} />
        </View>
      </View>
    </View>
  );
}
