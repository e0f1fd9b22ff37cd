/** A glyph of the sheet, drawn in one colour. It is decoration unless it is given a label: the word always stands beside it. */
import { glyphPaths, type GlyphName } from './glyph-paths';

interface GlyphProps {
  name: GlyphName;
  colour: string;
  size?: number;
  label?: string;
}

export function Glyph({ name, colour, size = 16, label }: GlyphProps) {
  return (
    <svg
      width={size}
      height={size}
      viewBox="0 0 16 16"
      fill="none"
      stroke={colour}
      strokeWidth={1.5}
      style={{ flex: 'none', display: 'block' }}
      {...(label ? { role: 'img', 'aria-label': label } : { 'aria-hidden': true })}
    >
      <path d={glyphPaths[name]} />
    </svg>
  );
}
