/** What can be changed: a table of prices where there is room, else a list in which each remedy has a row of words for what it moves. */
import { View } from 'react-native';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import { useLayout } from '@/components/ui/use-layout';
import type { CatalogueEntry } from '@/server/contract/catalogue';
import { PriceWord } from './price-word';
import { prices, priceWord } from './price-words';
import { RemedyTable } from './remedy-table';

interface RemedyListProps {
  name: string;
  remedies: CatalogueEntry['remedies'];
}

function Remedy({ remedy: { change, who, price: sentence, moves } }: { remedy: CatalogueEntry['remedies'][number] }) {
  const { colours } = useTheme();
  const moved = prices.filter((price) => priceWord(price, moves) !== null);
  return (
    <View role="listitem" style={{ paddingTop: 9, paddingBottom: space(2), gap: 3, borderBottomWidth: 1, borderBottomColor: colours.rule }}>
      <Text variant="caseTitle" style={{ fontSize: 15 }}>
        {change}
      </Text>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', columnGap: space(4), rowGap: 2 }}>
        {moved.map((price) => (
          <PriceWord key={price} price={price} moves={moves} named />
        ))}
        {moved.length === 0 ? (
          <Text variant="small" tone="inkFaint">
            scan the same
          </Text>
        ) : null}
      </View>
      <Text variant="detail" tone="inkSoft">
        {sentence}
      </Text>
      {who === 'technologist' ? null : (
        <Text variant="small" tone="inkFaint">
          {who}
        </Text>
      )}
    </View>
  );
}

export function RemedyList({ name, remedies }: RemedyListProps) {
  const wide = useLayout() === 'wide';
  if (wide) return <RemedyTable name={name} remedies={remedies} />;
  return (
    <View role="list" aria-label={name}>
      {remedies.map((remedy) => (
        <Remedy key={remedy.change} remedy={remedy} />
      ))}
    </View>
  );
}
