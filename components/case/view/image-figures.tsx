/** An image of a case and, beside it, its k-space: the transform of a magnitude image, which is not raw data. Of several frames one is chosen. */
import { useState } from 'react';
import { View } from 'react-native';
import { frameThumbnailOf } from '@/components/api/frames';
import { useImage } from '@/components/api/images';
import { FrameStrip } from '@/components/image/frame-strip';
import { useSlices } from '@/components/api/series';
import { LinkText } from '@/components/ui/link-text';
import { ProblemNotice } from '@/components/ui/problem-notice';
import { space } from '@/components/ui/theme';
import type { Case } from '@/server/contract/cases';
import type { Image } from '@/server/contract/images';
import type { Slice } from '@/server/contract/series';
import { kspaceOrigin } from '@/components/bench/own-phase';
import { imageRoleWords } from '../words';
import { EmptyFrame } from './empty-frame';
import { Figure } from './figure';

interface ImageFiguresProps {
  image: Case['images'][number];
  size: number;
  withKspace: boolean;
  /** Opens the series around the image. */
  onOpenSeries?: (() => void) | undefined;
}

/** Short, below a small picture: what its k-space is. */
function kspaceNote(image: Image, frame: number): string {
  if (image.kspace === 'raw') return kspaceOrigin(image, frame);
  return image.component === 'magnitude' ? 'not raw data' : image.component;
}

const kspaceRole = { word: 'its k-space', glyph: 'image', tone: 'matInk' } as const;

export function ImageFigures({ image: { imageId, role }, size, withKspace, onOpenSeries }: ImageFiguresProps) {
  const { data: image, error, refetch } = useImage(imageId);
  const { data: slices = [] } = useSlices(imageId);
  const [frame, setFrame] = useState(0);
  if (error) return <ProblemNotice error={error} onRetry={() => void refetch()} />;
  if (!image) return <EmptyFrame size={size} />;
  const { seriesNumber, instanceNumber, phaseEncode } = image.acquisition;
  const place = [
    seriesNumber.value === null ? '' : `series ${seriesNumber.value}`,
    instanceNumber.value === null ? '' : `image ${instanceNumber.value}`,
  ].filter(Boolean);
  const lines = phaseEncode.value === 'column' ? image.rows : image.columns;
  const words = imageRoleWords[role];
  const common = { size, lines, phaseEncode: phaseEncode.value };
  const note = phaseEncode.value === null ? 'phase direction not said' : place.join(', ') || `${image.columns} × ${image.rows}`;
  const figures = (
    <View style={{ flexDirection: 'row', gap: space(2) }}>
      <Figure {...common} source={frameThumbnailOf(imageId, frame)} alt={words.word} role={words} note={note} />
      {withKspace ? (
        <Figure
          {...common}
          source={frameThumbnailOf(imageId, frame, 'kspace')}
          alt={`k-space of the ${words.word}`}
          role={kspaceRole}
          edge="phase-encode line"
          note={kspaceNote(image, frame)}
        />
      ) : null}
    </View>
  );
  if (image.frames === 1)
    return (
      <View>
        {figures}
        {onOpenSeries && slices.length > 1 ? <SeriesLink slices={slices} imageId={imageId} onPress={onOpenSeries} /> : null}
      </View>
    );
  return (
    <View style={{ width: withKspace ? 2 * size + space(2) : size }}>
      {figures}
      <FrameStrip image={image} of={words.word} value={frame} onChange={setFrame} />
    </View>
  );
}

function SeriesLink({ slices, imageId, onPress }: { slices: readonly Slice[]; imageId: string; onPress: () => void }) {
  const label = `slice ${slices.findIndex((slice) => slice.imageId === imageId) + 1} of ${slices.length}`;
  return <LinkText label={label} name={`${label}: look along the series`} onPress={onPress} />;
}
