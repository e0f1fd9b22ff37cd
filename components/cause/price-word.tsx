/** What a remedy does to one column: its word, and a triangle where it may leave an operating mode or the conditions of an implant. */
import { View } from 'react-native';
import { Glyph } from '@/components/ui/glyph';
import { Text } from '@/components/ui/text';
import { useTheme } from '@/components/ui/theme-context';
import type { Moves } from '@/server/contract/catalogue';
import { needsCare, priceHead, priceWord, type Price } from './price-words';

interface PriceWordProps {
  price: Price;
  moves: Moves;
  /** Names the column too, where there is no head above it. */
  named?: boolean;
}

export function PriceWord({ price, moves, named = false }: PriceWordProps) {
  const { colours } = useTheme();
  const word = priceWord(price, moves);
  const care = needsCare(price, moves);
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: 4 }}>
      {care ? <Glyph name="danger" colour={colours.madder} size={14} /> : null}
      <Text variant="small" tone={care ? 'madder' : word === null ? 'inkFaint' : 'ink'} numberOfLines={1}>
        {named ? `${priceHead(price)} ` : ''}
        {word ?? 'same'}
      </Text>
    </View>
  );
}
