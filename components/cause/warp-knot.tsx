/** A stage on the warp thread that runs through all of them: filled where something fits, open where nothing does. */
import { View } from 'react-native';
import { useTheme } from '@/components/ui/theme-context';

interface WarpKnotProps {
  first: boolean;
  last: boolean;
  /** From the top of the stage to the knot, pixels. */
  top: number;
  filled: boolean;
}

const side = 12;

export function WarpKnot({ first, last, top, filled }: WarpKnotProps) {
  const { colours } = useTheme();
  return (
    <View style={{ position: 'absolute', left: 0, top: 0, bottom: 0, width: side, pointerEvents: 'none' }} aria-hidden>
      <View
        style={[
          { position: 'absolute', left: side / 2 - 1, width: 2, top: first ? top : -1, backgroundColor: colours.ruleStrong },
          last ? { height: first ? 0 : top + 1 } : { bottom: 0 },
        ]}
      />
      <View
        style={{
          position: 'absolute',
          left: 0,
          top,
          width: side,
          height: side,
          borderWidth: 2,
          borderColor: colours.ruleStrong,
          backgroundColor: filled ? colours.ruleStrong : colours.cloth,
        }}
      />
    </View>
  );
}
