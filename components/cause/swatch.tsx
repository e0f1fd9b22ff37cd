/**
 * A swatch of the sample book: half picture, half k-space on its mat, the stitched selvedge at its right, the name under it; the way to
 * its page. One that the filters leave out stays in its place as a stitched outline.
 */
import { useState } from 'react';
import { View } from 'react-native';
import { swatchOf } from '@/components/api/catalogue';
import { Press } from '@/components/ui/press';
import { insideBar, webStyle } from '@/components/ui/stitches';
import { Text } from '@/components/ui/text';
import { useTheme } from '@/components/ui/theme-context';
import type { CatalogueEntry } from '@/server/contract/catalogue';
import { mat, selvedge, swatchEdges } from './book-columns';

interface SwatchProps {
  cause: CatalogueEntry;
  /** Sides of the picture, pixels; what does not fit is cut off above and below. */
  width: number;
  height: number;
  /** Left out by the filters. */
  outlined?: boolean;
}

/** Enough to be telling, and not yet the worst. */
const usualStrength = 0.6;

function Cut({ cause, width, height }: Omit<SwatchProps, 'outlined'>) {
  const { colours } = useTheme();
  const [state, setState] = useState<'waiting' | 'drawn' | 'failed'>('waiting');
  const edge = { borderStyle: 'dashed' as const, borderColor: colours.inkSoft };
  return (
    <View style={{ flexDirection: 'row', gap: mat }}>
      <View style={{ padding: mat, backgroundColor: colours.mat }}>
        <View style={{ width, height, backgroundColor: colours.matRaised, alignItems: 'center', justifyContent: 'center' }}>
          {state === 'failed' ? (
            <Text variant="caption" tone="matInkSoft">
              not fetched
            </Text>
          ) : (
            <img
              src={swatchOf(cause.id, { strength: usualStrength })}
              alt=""
              width={width}
              height={height}
              loading="lazy"
              decoding="async"
              onLoad={() => setState('drawn')}
              onError={() => setState('failed')}
              style={{ display: 'block', width, height, objectFit: 'cover' }}
            />
          )}
          {state === 'drawn' ? (
            <View
              style={[
                { position: 'absolute', left: width / 2, top: 0, bottom: 0, width: 1 },
                webStyle({ backgroundImage: 'repeating-linear-gradient(180deg, #FFFFFF 0 4px, transparent 4px 7px)' }),
              ]}
            />
          ) : null}
        </View>
      </View>
      <View style={{ width: selvedge, marginVertical: mat, borderLeftWidth: 1, borderRightWidth: 1, ...edge }} />
    </View>
  );
}

export function Swatch({ cause, width, height, outlined = false }: SwatchProps) {
  const { colours } = useTheme();
  return (
    <Press
      href={{ pathname: '/causes/[causeId]', params: { causeId: cause.id } }}
      aria-label={`${cause.title}: ${cause.looks.image}`}
      style={({ hovered }) => [{ width: width + swatchEdges, paddingBottom: 6 }, hovered ? insideBar('bottom', 2, colours.indigo) : null]}
    >
      {outlined ? (
        <View
          style={{
            width: width + 2 * mat,
            height: height + 2 * mat,
            borderWidth: 1,
            borderStyle: 'dashed',
            borderColor: colours.ruleStrong,
          }}
        />
      ) : (
        <Cut cause={cause} width={width} height={height} />
      )}
      <Text variant="detail" tone={outlined ? 'inkFaint' : 'ink'} style={{ fontSize: 13, lineHeight: 16, paddingTop: 6, paddingLeft: mat }}>
        {cause.title}
      </Text>
    </Press>
  );
}
