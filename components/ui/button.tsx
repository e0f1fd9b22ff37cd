/**
 * A button. `first` is the one filled block of a screen, `quiet` has a border, `plain` is words alone. Disabled is stitched: it
 * is not yet. Busy keeps its width and lays a thread inside the lower edge, as long as the work that is done.
 */
import { View, type StyleProp, type ViewStyle } from 'react-native';
import type { Href } from 'expo-router';
import { useId } from 'react';
import { Glyph } from './glyph';
import type { GlyphName } from './glyph-paths';
import { Press } from './press';
import { insideBar } from './stitches';
import { Text } from './text';
import { radius, space, touchTarget, type Colours } from './theme';
import { useTheme } from './theme-context';

export type ButtonKind = 'first' | 'quiet' | 'plain';

interface ButtonProps {
  label: string;
  kind?: ButtonKind;
  glyph?: GlyphName;
  onPress?: () => void;
  href?: Href;
  disabled?: boolean;
  /** Why it is disabled, or what it does beyond its word: spoken after its name. */
  hint?: string;
  /** Work under way: true, or the part of it that is done, 0 to 1. */
  busy?: boolean | number;
  grow?: boolean;
  tall?: boolean;
  small?: boolean;
  style?: StyleProp<ViewStyle>;
}

const inkOf = (kind: ButtonKind, disabled: boolean) => (disabled ? 'inkFaint' : kind === 'first' ? 'onIndigo' : 'ink');

function frame(kind: ButtonKind, disabled: boolean, colours: Colours): ViewStyle {
  if (disabled) return { borderColor: colours.ruleStrong, borderStyle: 'dashed' };
  if (kind === 'first') return { borderColor: colours.indigoFill, backgroundColor: colours.indigoFill };
  return { borderColor: kind === 'plain' ? 'transparent' : colours.ruleStrong };
}

export function Button({ label, kind = 'quiet', glyph, onPress, href, disabled = false, hint, busy = false, ...size }: ButtonProps) {
  const { colours } = useTheme();
  const id = useId();
  const working = busy !== false;
  const still = disabled || working;
  const tone = inkOf(kind, disabled);
  const bar = kind === 'first' ? colours.onIndigo : colours.indigo;
  return (
    <Press
      onPress={onPress}
      href={still ? undefined : href}
      disabled={still}
      aria-label={label}
      aria-disabled={still}
      aria-busy={working}
      {...(hint ? { 'aria-describedby': id } : {})}
      style={({ hovered }) => [
        {
          minHeight: size.tall ? 48 : touchTarget,
          paddingHorizontal: size.small || kind === 'plain' ? space(3) : space(4),
          borderWidth: 1,
          borderRadius: radius.control,
          flexDirection: 'row',
          alignItems: 'center',
          justifyContent: 'center',
          gap: space(2),
        },
        size.grow ? { flexGrow: 1, flexShrink: 1 } : { flexGrow: 0 },
        frame(kind, disabled, colours),
        hovered ? insideBar('bottom', 3, bar) : null,
        size.style,
      ]}
    >
      {hint ? (
        <span id={id} hidden>
          {hint}
        </span>
      ) : null}
      {glyph ? <Glyph name={glyph} colour={colours[tone]} /> : null}
      <Text variant={size.small ? 'label' : 'control'} tone={tone} numberOfLines={1}>
        {label}
      </Text>
      {working ? (
        <View
          style={{
            position: 'absolute',
            left: 0,
            bottom: 0,
            height: 3,
            width: `${busy === true ? 60 : Math.round(busy * 100)}%`,
            backgroundColor: bar,
          }}
        />
      ) : null}
    </Press>
  );
}
