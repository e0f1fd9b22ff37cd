/**
 * What every control is made of: a pressable with a role, a name, a hover state and a key path. With `href` it is a real link
 * (opens in a new tab, shows its address), which expo-router follows inside the app.
 */
import { Link, type Href } from 'expo-router';
import { useState, type KeyboardEvent, type ReactNode } from 'react';
import { Pressable, StyleSheet, type PressableProps, type StyleProp, type ViewStyle } from 'react-native';

export interface PressState {
  readonly hovered: boolean;
}

export interface PressProps extends Omit<PressableProps, 'style' | 'children' | 'onPress'> {
  onPress?: (() => void) | undefined;
  href?: Href | undefined;
  /** Space presses a checkbox, a radio and an option too; the browser does that for buttons only. */
  pressOnSpace?: boolean;
  onKeyDown?: (event: KeyboardEvent) => void;
  style: (state: PressState) => StyleProp<ViewStyle>;
  children: ReactNode | ((state: PressState) => ReactNode);
}

export function Press({ onPress, href, pressOnSpace = false, onKeyDown, style, children, ...rest }: PressProps) {
  const [hovered, setHovered] = useState(false);
  const state: PressState = { hovered: hovered && !rest.disabled };
  const keys = {
    onKeyDown: (event: KeyboardEvent) => {
      onKeyDown?.(event);
      if (!pressOnSpace || event.key !== ' ' || rest.disabled) return;
      event.preventDefault();
      onPress?.();
    },
  };
  const body = (
    <Pressable
      role={href ? 'link' : 'button'}
      {...rest}
      {...(pressOnSpace || onKeyDown ? keys : {})}
      {...(onPress ? { onPress: () => onPress() } : {})}
      onHoverIn={() => setHovered(true)}
      onHoverOut={() => setHovered(false)}
      style={StyleSheet.flatten(style(state))}
    >
      {typeof children === 'function' ? children(state) : children}
    </Pressable>
  );
  if (!href) return body;
  return (
    <Link href={href} asChild>
      {body}
    </Link>
  );
}
