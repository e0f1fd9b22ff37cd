/**
 * A picture on its mat: neutral grey around it in both themes, nothing written on it. A simulated one has a stitched frame. Until
 * it is there the mat is empty and still; a picture that cannot be fetched says so.
 */
import { useState } from 'react';
import { View } from 'react-native';
import { Text } from './text';
import { useTheme } from './theme-context';

interface PictureProps {
  /** Address on our own origin, or null where there is no picture. */
  source: string | null;
  /** What it shows; empty where the words beside it say so. */
  alt: string;
  size: number;
  height?: number;
  mat?: number;
  simulated?: boolean;
}

export function Picture({ source, alt, size, height = size, mat = 3, simulated = false }: PictureProps) {
  const { colours } = useTheme();
  const [failed, setFailed] = useState(false);
  const [isThere, setIsThere] = useState(false);
  const frame = simulated
    ? { borderWidth: 1, borderStyle: 'dashed' as const, borderColor: colours.matInk, padding: 2 }
    : source
      ? { padding: mat }
      : { borderWidth: 1, borderStyle: 'dashed' as const, borderColor: colours.ruleStrong, padding: mat - 1 };
  return (
    <View
      style={[
        { flex: 0, flexBasis: 'auto', flexShrink: 0, alignSelf: 'flex-start', backgroundColor: source ? colours.mat : 'transparent' },
        frame,
      ]}
    >
      {source && !failed ? (
        <img
          src={source}
          alt={alt}
          width={size}
          height={height}
          loading="lazy"
          decoding="async"
          onLoad={() => setIsThere(true)}
          onError={() => setFailed(true)}
          style={{ display: 'block', width: size, height, objectFit: 'contain', background: isThere ? '#000' : 'transparent' }}
        />
      ) : (
        <View style={{ width: size, height, alignItems: 'center', justifyContent: 'center' }}>
          {failed && size >= 72 ? (
            <Text variant="caption" tone="matInkSoft" style={{ textAlign: 'center' }}>
              not fetched
            </Text>
          ) : null}
        </View>
      )}
    </View>
  );
}
