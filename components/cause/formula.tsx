/**
 * A formula, from TeX to MathML: the browser sets it, it prints as text, and a screen reader speaks it. What cannot be read as TeX
 * stands as it is written. The setter is loaded with the first formula.
 */
import { useEffect, useState } from 'react';
import { View } from 'react-native';
import { Text } from '@/components/ui/text';
import { useTheme } from '@/components/ui/theme-context';

/** Fonts for mathematics that systems have; the browser's own where there is none. */
const mathFonts = "'STIX Two Math', 'Cambria Math', 'Latin Modern Math', 'Noto Sans Math', math, serif";

const rules = `
.formula { overflow-x: auto; overflow-y: hidden; padding: 8px 0; }
.formula math { font-family: ${mathFonts}; font-size: 19px; line-height: normal; }
.formula mo.tml-prime { transform: translateY(.42em) scale(1.35); }
.formula mtable { text-align: left; }
.formula mtd { padding: 2px 6px; }
@media print { .formula { overflow: visible; } }
`;

async function asMathMl(tex: string): Promise<string | null> {
  try {
    const { default: temml } = await import('temml');
    return temml.renderToString(tex, { displayMode: false, throwOnError: true });
  } catch (reason) {
    console.warn('A formula could not be set; it stands as TeX.', reason);
    return null;
  }
}

export function Formula({ tex }: { tex: string }) {
  const { colours } = useTheme();
  const [set, setSet] = useState<{ tex: string; mathMl: string | null } | null>(null);
  useEffect(() => {
    let current = true;
    void asMathMl(tex).then((mathMl) => {
      if (current) setSet({ tex, mathMl });
    });
    return () => {
      current = false;
    };
  }, [tex]);
  if (set?.tex !== tex) return <View style={{ height: 44 }} />;
  if (set.mathMl === null) return <Text variant="mono">{tex}</Text>;
  return (
    <>
      <style href="formula" precedence="component">
        {rules}
      </style>
      <div
        className="formula"
        role="group"
        aria-label="the model as a formula"
        tabIndex={0}
        style={{ color: colours.ink }}
        dangerouslySetInnerHTML={{ __html: set.mathMl }}
      />
    </>
  );
}
