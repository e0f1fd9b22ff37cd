/** Remedies of a wide page, to be compared: a row each, its price in columns, the sentence under what is changed. */
import { View } from 'react-native';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { CatalogueEntry } from '@/server/contract/catalogue';
import { PriceWord } from './price-word';
import { priceHead, prices, type Price } from './price-words';

/** As wide as the longest of head and word, with the triangle, pixels. */
const columnWidth: Record<Price, number> = { time: 68, snr: 68, contrast: 76, sar: 76, nerveStimulation: 96, implantConditions: 76 };

interface RemedyTableProps {
  name: string;
  remedies: CatalogueEntry['remedies'];
}

export function RemedyTable({ name, remedies }: RemedyTableProps) {
  const { colours } = useTheme();
  const row = { flexDirection: 'row', borderBottomWidth: 1 } as const;
  return (
    <View role="table" aria-label={name}>
      <View role="row" style={[row, { borderBottomColor: colours.ruleStrong, alignItems: 'flex-end', paddingBottom: 4 }]}>
        <View role="columnheader" style={{ flex: 1 }}>
          <Text variant="small" tone="inkFaint">
            change
          </Text>
        </View>
        {prices.map((price) => (
          <View key={price} role="columnheader" style={{ width: columnWidth[price], paddingLeft: space(2) }}>
            <Text variant="small" tone="inkFaint">
              {priceHead(price)}
            </Text>
          </View>
        ))}
      </View>
      {remedies.map(({ change, who, price: sentence, moves }) => (
        <View role="row" key={change} style={[row, { borderBottomColor: colours.rule, paddingTop: 9, paddingBottom: space(2) }]}>
          <View role="rowheader" style={{ flex: 1, minWidth: 0, paddingRight: space(3), gap: 2 }}>
            <Text variant="caseTitle" style={{ fontSize: 15 }}>
              {change}
            </Text>
            <Text variant="detail" tone="inkSoft">
              {sentence}
            </Text>
            {who === 'technologist' ? null : (
              <Text variant="small" tone="inkFaint">
                {who}
              </Text>
            )}
          </View>
          {prices.map((price) => (
            <View key={price} role="cell" style={{ width: columnWidth[price], paddingLeft: space(2), paddingTop: 2 }}>
              <PriceWord price={price} moves={moves} />
            </View>
          ))}
        </View>
      ))}
    </View>
  );
}
