/**
 * The frames of an image as small pictures on a strip of the mat; the chosen one is held by a bar. Arrows move the choice, Home and End go to the
 * ends. Pictures are fetched as they come into sight.
 */
import { useRef, type KeyboardEvent } from 'react';
import { ScrollView, View } from 'react-native';
import { frameThumbnailOf } from '@/components/api/frames';
import { Picture } from '@/components/ui/picture';
import { Press } from '@/components/ui/press';
import { insideBar } from '@/components/ui/stitches';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { Image } from '@/server/contract/images';
import { frameWords } from './frame-words';

interface FrameStripProps {
  image: Pick<Image, 'id' | 'frames' | 'frameFacts'>;
  /** Whose frames: `bad image`. */
  of: string;
  value: number;
  onChange: (frame: number) => void;
}

const side = 44;
/** Pictures with their bar, and the line of words over them. */
export const frameStripHeight = side + 12 + 24;

const steps: Record<string, number> = { ArrowRight: 1, ArrowDown: 1, ArrowLeft: -1, ArrowUp: -1, Home: -Infinity, End: Infinity };

export function FrameStrip({ image, of, value, onChange }: FrameStripProps) {
  const { colours } = useTheme();
  const group = useRef<View>(null);
  const last = image.frames - 1;
  const move = (event: KeyboardEvent): void => {
    const step = steps[event.key];
    if (step === undefined) return;
    event.preventDefault();
    const next = Math.max(0, Math.min(last, value + step));
    onChange(next);
    (group.current as unknown as HTMLElement | null)?.querySelectorAll<HTMLElement>('[role=radio]')[next]?.focus();
  };
  return (
    <View style={{ backgroundColor: colours.mat, paddingHorizontal: space(2) }}>
      <Text variant="small" tone="matInkSoft" numberOfLines={1} style={{ lineHeight: 24 }}>
        {`${of}: ${frameWords(image, value)}`}
      </Text>
      <ScrollView horizontal showsHorizontalScrollIndicator={false}>
        <View ref={group} role="radiogroup" aria-label={`frame of the ${of}`} style={{ flexDirection: 'row', gap: 4 }}>
          {Array.from({ length: image.frames }, (_, frame) => (
            <Press
              key={frame}
              role="radio"
              aria-checked={frame === value}
              aria-label={frameWords(image, frame)}
              pressOnSpace
              tabIndex={frame === value ? 0 : -1}
              onPress={() => onChange(frame)}
              onKeyDown={move}
              style={({ hovered }) => [
                { paddingBottom: 6, paddingTop: 2 },
                frame === value ? insideBar('bottom', 3, colours.indigo) : hovered ? insideBar('bottom', 3, colours.matInkSoft) : null,
              ]}
            >
              <Picture source={frameThumbnailOf(image.id, frame)} alt="" size={side} mat={0} />
            </Press>
          ))}
        </View>
      </ScrollView>
    </View>
  );
}
