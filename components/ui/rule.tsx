/** A hairline: solid between rows, strong under a head, stitched where something is not yet. */
import { View } from 'react-native';
import { stitchedLine } from './stitches';
import { useTheme } from './theme-context';

interface RuleProps {
  kind?: 'row' | 'strong' | 'stitched';
}

export function Rule({ kind = 'row' }: RuleProps) {
  const { colours } = useTheme();
  if (kind === 'stitched') return <View style={[{ height: 1 }, stitchedLine(colours.ruleStrong)]} />;
  return <View style={{ height: 1, backgroundColor: kind === 'strong' ? colours.ruleStrong : colours.rule }} />;
}
