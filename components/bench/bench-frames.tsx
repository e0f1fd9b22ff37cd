/** Which frames lie on the bench, where an image has several: those of the bad image, and of the comparison where it goes its own way. */
import { View } from 'react-native';
import { FrameStrip, frameStripHeight } from '@/components/image/frame-strip';
import { partnerFrame } from '@/components/image/frame-words';
import { useBench, type CaseOnBench } from './bench-context';

const ownStrip = ({ bad, source }: Pick<CaseOnBench, 'bad' | 'source'>): boolean =>
  source.id !== bad.id && source.frames > 1 && source.frames !== bad.frames;

/** The height that the strips take: none where both images have one frame. */
export const framesHeight = (images: Pick<CaseOnBench, 'bad' | 'source'>): number =>
  ((images.bad.frames > 1 ? 1 : 0) + (ownStrip(images) ? 1 : 0)) * frameStripHeight;

export function BenchFrames() {
  const { bad, source, view, change } = useBench();
  const chooseBad = (badFrame: number): void => change({ badFrame, sourceFrame: partnerFrame(badFrame, bad, source, view.sourceFrame) });
  return (
    <View>
      {bad.frames > 1 ? <FrameStrip image={bad} of="bad image" value={view.badFrame} onChange={chooseBad} /> : null}
      {ownStrip({ bad, source }) ? (
        <FrameStrip image={source} of="comparison image" value={view.sourceFrame} onChange={(sourceFrame) => change({ sourceFrame })} />
      ) : null}
    </View>
  );
}
