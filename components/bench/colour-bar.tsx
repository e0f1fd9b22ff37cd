/** The colours of a picture that is not grey, from its lowest value to its highest. */
import { View } from 'react-native';
import { cyclicTable, divergingTable } from '@/components/image/colour-table';
import { Text } from '@/components/ui/text';

const nStops = 24;

function stopsOf(kind: 'phase' | 'difference'): string[] {
  const table = kind === 'phase' ? cyclicTable(-Math.PI, Math.PI) : divergingTable(1, -1, 1);
  return Array.from({ length: nStops }, (_, i) => {
    const colour = table[Math.round((i / (nStops - 1)) * 65535)] ?? 0;
    return `rgb(${colour & 255} ${(colour >> 8) & 255} ${(colour >> 16) & 255})`;
  });
}

const bars = { phase: stopsOf('phase'), difference: stopsOf('difference') };

interface ColourBarProps {
  kind: 'phase' | 'difference';
  low: string;
  high: string;
}

export function ColourBar({ kind, low, high }: ColourBarProps) {
  return (
    <View role="img" aria-label={`colours from ${low} to ${high}`} style={{ flexDirection: 'row', alignItems: 'center', gap: 6 }}>
      <Text variant="caption" tone="matInkSoft">
        {low}
      </Text>
      <svg width={nStops * 3} height={8} aria-hidden style={{ display: 'block' }}>
        {bars[kind].map((colour, i) => (
          <rect key={i} x={i * 3} width={3} height={8} fill={colour} />
        ))}
      </svg>
      <Text variant="caption" tone="matInkSoft">
        {high}
      </Text>
    </View>
  );
}
