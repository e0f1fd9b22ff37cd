/** The five words at the foot of a phone; 'new' is filled, because filing is what a phone is for. */
import { View } from 'react-native';
import { Press } from '@/components/ui/press';
import { insideBar } from '@/components/ui/stitches';
import { Text } from '@/components/ui/text';
import { useTheme } from '@/components/ui/theme-context';
import { account, isAt, places, type Place } from './places';

const fileOne: Place = { word: '+ new', href: '/cases/new', path: '/cases/new' };
const [first, second, third] = places;
const words = [first, second, fileOne, third, account].filter((place) => place !== undefined);

export function Foot({ pathname }: { pathname: string }) {
  const { colours } = useTheme();
  return (
    <View
      role="navigation"
      aria-label="places"
      style={{ height: 56, flexDirection: 'row', backgroundColor: colours.clothSunk, borderTopWidth: 1, borderTopColor: colours.rule }}
    >
      {words.map((place) => {
        const filled = place === fileOne;
        const on = !filled && isAt(place, pathname);
        return (
          <Press
            key={place.word}
            href={place.href}
            aria-label={filled ? 'new case' : place.word}
            {...(on ? { 'aria-current': 'page' } : {})}
            style={({ hovered }) => [
              {
                flexBasis: 0,
                flexGrow: 1,
                alignItems: 'center',
                justifyContent: 'center',
                backgroundColor: filled ? colours.indigoFill : 'transparent',
              },
              hovered ? insideBar('bottom', 2, filled ? colours.onIndigo : colours.indigo) : null,
            ]}
          >
            {on ? (
              <View style={{ position: 'absolute', top: -1, left: 12, right: 12, height: 2, backgroundColor: colours.indigo }} />
            ) : null}
            <Text
              variant={on ? 'smallStrong' : 'small'}
              tone={filled ? 'onIndigo' : on ? 'ink' : 'inkSoft'}
              style={{ letterSpacing: -0.24 }}
            >
              {place.word}
            </Text>
          </Press>
        );
      })}
    </View>
  );
}
