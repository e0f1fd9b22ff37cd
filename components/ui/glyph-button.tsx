/** A glyph that is a control: 44 by 44, with a spoken name. */
import type { Href } from 'expo-router';
import { Glyph } from './glyph';
import type { GlyphName } from './glyph-paths';
import { Press } from './press';
import { insideBar } from './stitches';
import { touchTarget } from './theme';
import { useTheme } from './theme-context';

interface GlyphButtonProps {
  glyph: GlyphName;
  label: string;
  onPress?: () => void;
  href?: Href;
  disabled?: boolean;
  expanded?: boolean;
}

export function GlyphButton({ glyph, label, onPress, href, disabled = false, expanded }: GlyphButtonProps) {
  const { colours } = useTheme();
  return (
    <Press
      onPress={onPress}
      href={href}
      disabled={disabled}
      aria-label={label}
      {...(expanded === undefined ? {} : { 'aria-expanded': expanded })}
      style={({ hovered }) => [
        { width: touchTarget, height: touchTarget, alignItems: 'center', justifyContent: 'center' },
        hovered ? insideBar('bottom', 2, colours.indigo) : null,
      ]}
    >
      <Glyph name={glyph} colour={disabled ? colours.inkFaint : colours.ink} />
    </Press>
  );
}
