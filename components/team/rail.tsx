/** The rail of a wide screen, 88 pixels: the mark, the places, and at its foot the theme and the account. */
import { View } from 'react-native';
import { Mark } from '@/components/ui/mark';
import { Press } from '@/components/ui/press';
import { Text } from '@/components/ui/text';
import { space, touchTarget } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import { account, isAt, places, type Place } from './places';

export const railWidth = 88;

function RailWord({ place, on }: { place: Place; on: boolean }) {
  const { colours } = useTheme();
  return (
    <Press
      href={place.href}
      aria-label={place.word}
      {...(on ? { 'aria-current': 'page' } : {})}
      style={({ hovered }) => ({
        height: touchTarget,
        justifyContent: 'center',
        paddingLeft: space(4),
        backgroundColor: hovered ? colours.cloth : 'transparent',
      })}
    >
      {on ? <View style={{ position: 'absolute', left: 0, top: 8, bottom: 8, width: 2, backgroundColor: colours.indigo }} /> : null}
      <Text variant={on ? 'smallStrong' : 'small'} tone={on ? 'ink' : 'inkSoft'}>
        {place.word}
      </Text>
    </Press>
  );
}

export function Rail({ pathname }: { pathname: string }) {
  const { colours, name, choose } = useTheme();
  const other = name === 'light' ? 'dark' : 'light';
  return (
    <View
      role="navigation"
      aria-label="places"
      style={{
        width: railWidth,
        paddingVertical: space(4),
        backgroundColor: colours.clothSunk,
        borderRightWidth: 1,
        borderRightColor: colours.rule,
      }}
    >
      <Press
        href="/cases"
        aria-label="Pickglass: to the cases"
        style={() => ({ height: touchTarget, paddingLeft: space(4), marginBottom: space(3), marginTop: -6, justifyContent: 'center' })}
      >
        <Mark size={32} colour={colours.ink} />
      </Press>
      {places.map((place) => (
        <RailWord key={place.word} place={place} on={isAt(place, pathname)} />
      ))}
      <View style={{ flex: 1 }} />
      <Press
        onPress={() => choose(other)}
        aria-label={`theme: ${name}; change to ${other}`}
        style={({ hovered }) => ({
          height: touchTarget,
          justifyContent: 'center',
          paddingLeft: space(4),
          backgroundColor: hovered ? colours.cloth : 'transparent',
        })}
      >
        <Text variant="small" tone="inkSoft">
          {name}
        </Text>
      </Press>
      <RailWord place={account} on={isAt(account, pathname)} />
    </View>
  );
}
