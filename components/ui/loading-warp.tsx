/** Loading: the warp before the weft. Rows of stitches where the rows will be; still, nothing shimmers. */
import { View } from 'react-native';
import { stitchedLine } from './stitches';
import { Text } from './text';
import { space } from './theme';
import { useTheme } from './theme-context';

interface LoadingWarpProps {
  /** What is being fetched: 'fetching the cases'. */
  what: string;
  rows?: number;
  picture?: number;
}

export function LoadingWarp({ what, rows = 4, picture = 40 }: LoadingWarpProps) {
  const { colours } = useTheme();
  const stitches = [{ flex: 1, height: 12 }, stitchedLine(colours.ruleStrong)];
  return (
    <View role="status" aria-label={what} aria-busy style={{ paddingHorizontal: space(4) }}>
      {Array.from({ length: rows }, (_, row) => (
        <View
          key={row}
          style={{
            flexDirection: 'row',
            alignItems: 'center',
            gap: space(3),
            paddingVertical: space(3),
            borderBottomWidth: 1,
            borderBottomColor: colours.rule,
          }}
        >
          <View style={{ width: picture, height: picture, borderWidth: 1, borderStyle: 'dashed', borderColor: colours.ruleStrong }} />
          <View style={[...stitches, { flex: 3 }]} />
          <View style={stitches} />
        </View>
      ))}
      <Text variant="small" tone="inkSoft" style={{ paddingTop: space(3) }}>
        {what}
      </Text>
    </View>
  );
}
