/**
 * What is below it, printed as a page of its own: in the light theme, without rail, buttons and sliders, everything open and as long
 * as it is. Elements with `data-screen-only` are left out on paper.
 */
import { useMemo, useSyncExternalStore, type ReactNode } from 'react';
import { themes } from '@/components/ui/theme';
import { ThemeContext, useTheme } from '@/components/ui/theme-context';

/** A scrolling page has heights from the window at every level above it; on paper they are as high as what they hold. */
const rules = `
@media print {
  @page { margin: 14mm; }
  nav, [role='navigation'], [data-screen-only], [role='dialog'] { display: none !important; }
  html, body, :has([role='main']), [role='main'], [role='main'] > * { height: auto !important; min-height: 0 !important; overflow: visible !important; flex: 0 0 auto !important; position: static !important; }
  :has([role='main']), [role='main'] { width: 100% !important; display: block !important; background: transparent !important; }
  /* After the rule above, and stronger: the canvas of a dark scheme is dark by itself. */
  html:root:has([role='main']) { color-scheme: light !important; background: #fff !important; }
  [role='main'], [role='main'] * { background-color: transparent !important; }
  [role='region'], [role='figure'], [role='listitem'] { break-inside: avoid; }
  img { print-color-adjust: exact; }
}
`;

const printing = (): MediaQueryList => window.matchMedia('print');

function subscribe(listener: () => void): () => void {
  const query = printing();
  query.addEventListener('change', listener);
  return () => query.removeEventListener('change', listener);
}

export function PrintPage({ children }: { children: ReactNode }) {
  const theme = useTheme();
  const onPaper = useSyncExternalStore(subscribe, () => printing().matches);
  const shown = useMemo(() => (onPaper ? { ...theme, name: 'light' as const, colours: themes.light } : theme), [onPaper, theme]);
  return (
    <ThemeContext value={shown}>
      <style href="print-page" precedence="component">
        {rules}
      </style>
      {children}
    </ThemeContext>
  );
}
