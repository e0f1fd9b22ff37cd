/** Lines that are not yet solid: 4 on, 3 off. `backgroundImage` is known to the web target and not to React Native's types. */
import type { ViewStyle } from 'react-native';

/** A style that the web target knows and React Native's types do not. */
export const webStyle = (style: Record<string, string | number>): ViewStyle => style as ViewStyle;

export const stitchedLine = (colour: string): ViewStyle =>
  webStyle({
    backgroundImage: `repeating-linear-gradient(90deg, ${colour} 0 4px, transparent 4px 7px)`,
    backgroundPosition: 'left bottom',
    backgroundSize: '100% 1px',
    backgroundRepeat: 'no-repeat',
  });

/** A bar inside an edge, without moving what the element holds. */
export const insideBar = (edge: 'bottom' | 'left' | 'top', thickness: number, colour: string): ViewStyle => {
  const offset = { bottom: `0 -${thickness}px`, left: `${thickness}px 0`, top: `0 ${thickness}px` }[edge];
  return { boxShadow: `inset ${offset} 0 ${colour}` };
};
