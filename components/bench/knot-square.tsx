/** A knot on the warp thread: filled where something acts, open where nothing does, indigo where it is on the table, stitched: not yet. */
import { View } from 'react-native';
import { useTheme } from '@/components/ui/theme-context';

interface KnotSquareProps {
  look: 'chosen' | 'on' | 'off' | 'not-yet';
  ground?: 'cloth' | 'clothRaised';
}

const side = 14;

export function KnotSquare({ look, ground = 'cloth' }: KnotSquareProps) {
  const { colours } = useTheme();
  const colour = look === 'chosen' ? colours.indigo : colours.ruleStrong;
  const filled = look === 'chosen' || look === 'on';
  return (
    <View
      style={{
        width: side,
        height: side,
        borderWidth: look === 'not-yet' ? 1 : 2,
        borderStyle: look === 'not-yet' ? 'dashed' : 'solid',
        borderColor: colour,
        backgroundColor: filled ? colour : colours[ground],
      }}
    />
  );
}
