/** The images of a case on one mat: the bad ones with their k-space, then the others. */
import { useState } from 'react';
import { View } from 'react-native';
import { gutter, space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { Case } from '@/server/contract/cases';
import { ImageFigures } from './image-figures';
import { Neighbours } from './neighbours';

interface ImagesMatProps {
  images: Case['images'];
  /** Where it is given, the series around an image can be looked along. */
  found?: Case;
  /** Pixels at the left and right. */
  gutters?: number;
}

/** Two figures beside each other on a phone, up to four on a wide screen, never larger than 204 or smaller than 120. */
export const figureSize = (room: number): number => {
  const across = room >= 4 * 160 ? 4 : 2;
  return Math.max(120, Math.min(204, Math.floor((room - (across - 1) * space(2)) / across)));
};

export function ImagesMat({ images, found, gutters = gutter.phone }: ImagesMatProps) {
  const { colours } = useTheme();
  const [room, setRoom] = useState(0);
  const [openSeries, setOpenSeries] = useState<string | null>(null);
  const opened = images.find(({ imageId }) => imageId === openSeries);
  const bad = images.filter(({ role }) => role === 'bad');
  const others = images.filter(({ role }) => role !== 'bad');
  return (
    <View style={{ backgroundColor: colours.mat, paddingHorizontal: gutters, paddingTop: space(4), paddingBottom: space(3) }}>
      <View
        onLayout={(event) => setRoom(event.nativeEvent.layout.width)}
        style={{ flexDirection: 'row', flexWrap: 'wrap', columnGap: space(2), rowGap: space(4) }}
      >
        {room > 0
          ? [...bad, ...others].map((image) => (
              <ImageFigures
                key={image.imageId}
                image={image}
                size={figureSize(room)}
                withKspace={image.role === 'bad'}
                onOpenSeries={found && (() => setOpenSeries(image.imageId))}
              />
            ))
          : null}
      </View>
      {found && opened ? <Neighbours key={opened.imageId} found={found} image={opened} onClose={() => setOpenSeries(null)} /> : null}
    </View>
  );
}
