/**
 * The few rules that no component can carry: the page's ground, focus that is seen, figures that line up and are not ligated,
 * placeholders, and rest where the system asks for it. `font` shorthands reset font features, hence the weight of the rule.
 */
import { useEffect } from 'react';
import { motion, type Colours, type ThemeName } from './theme';

interface GlobalStyleProps {
  colours: Colours;
  name: ThemeName;
}

const rulesFor = (colours: Colours, name: ThemeName): string => `
:root { color-scheme: ${name}; }
body { background: ${colours.cloth}; color: ${colours.ink}; -webkit-font-smoothing: antialiased; text-rendering: geometricPrecision; }
body, body * { font-feature-settings: 'liga' 0, 'calt' 0, 'zero' 1 !important; font-variant-numeric: tabular-nums slashed-zero; }
:focus { outline: none; }
:focus-visible { outline: 2px solid ${colours.indigo} !important; outline-offset: 2px; }
[data-field]:focus-within { outline: 2px solid ${colours.indigo}; outline-offset: 1px; }
[data-field] :focus-visible { outline: none !important; }
::placeholder { color: ${colours.inkFaint} !important; opacity: 1; }
::selection { background: ${colours.indigoFill}; color: ${colours.onIndigo}; }
[role='button'], [role='tab'], [role='radio'], [role='checkbox'], [role='menuitem'], [role='option'], a { transition: background-color ${motion.quick}ms linear, box-shadow ${motion.quick}ms linear; }
@media (prefers-reduced-motion: reduce) { *, *::before, *::after { transition: none !important; animation: none !important; scroll-behavior: auto !important; } }
`;

export function GlobalStyle({ colours, name }: GlobalStyleProps) {
  // The bar of a phone's browser takes the colour of the page.
  useEffect(() => {
    document.querySelector('meta[name="theme-color"]')?.setAttribute('content', colours.cloth);
    document.documentElement.dataset.theme = name;
  }, [colours, name]);
  return <style>{rulesFor(colours, name)}</style>;
}
