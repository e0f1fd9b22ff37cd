/** What can be changed about a cause: what, who may do it, and its price. A price that touches SAR, slew or implants is marked. */
import { View } from 'react-native';
import { Glyph } from '@/components/ui/glyph';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { CatalogueEntry } from '@/server/contract/catalogue';

type Remedy = CatalogueEntry['remedies'][number];

/** A remedy that may leave an implant's conditions or an operating mode: it says so in its price. */
export const needsCare = ({ price }: Remedy): boolean => /\b(SAR|slew|implant|nerve stimulation|operating mode)\b/i.test(price);

export function RemedyList({ remedies }: { remedies: readonly Remedy[] }) {
  const { colours } = useTheme();
  return (
    <View role="list">
      {remedies.map((remedy) => {
        const care = needsCare(remedy);
        return (
          <View
            role="listitem"
            key={remedy.change}
            style={{ paddingTop: 9, paddingBottom: space(2), borderBottomWidth: 1, borderBottomColor: colours.rule }}
          >
            <View style={{ flexDirection: 'row', gap: space(3), alignItems: 'baseline' }}>
              <Text variant="caseTitle" style={{ flex: 1, fontSize: 15 }}>
                {remedy.change}
              </Text>
              <Text variant="small" tone="inkSoft">
                {remedy.who}
              </Text>
            </View>
            <View style={{ flexDirection: 'row', gap: 6, paddingTop: 3 }}>
              {care ? <Glyph name="danger" colour={colours.madder} size={14} /> : null}
              <Text variant="small" tone={care ? 'madder' : 'inkSoft'} style={{ flex: 1 }}>
                <Text variant="small" tone="inkFaint">
                  price{' '}
                </Text>
                {remedy.price}
              </Text>
            </View>
          </View>
        );
      })}
    </View>
  );
}
