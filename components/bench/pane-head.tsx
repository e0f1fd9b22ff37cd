/** The line above a picture: which picture it is, each with its shape and its word; what a reader must know, at the right. */
import { View } from 'react-native';
import type { Domain } from '@/components/image/edge-scale';
import type { PaneContent } from '@/components/image/layers';
import { Badge } from '@/components/ui/badge';
import { Text } from '@/components/ui/text';
import { ColourBar } from './colour-bar';
import { KspaceMenu } from './kspace-menu';
import { cautionOf } from './pane-content';
import { useBench } from './bench-context';
import { significant } from '@/components/ui/number-text';

interface PaneHeadProps {
  domain: Domain;
  content: PaneContent;
  /** Below one another beside a small picture. */
  compact?: boolean;
}

export function PaneHead({ domain, content, compact = false }: PaneHeadProps) {
  const { view, kase, bad } = useBench();
  const caution = cautionOf(domain, content, view, bad);
  const span = domain === 'image' ? view.differenceSpan : view.logDifferenceSpan;
  const nBad = kase.images.filter(({ role }) => role === 'bad').length;
  return (
    <>
      {domain === 'kspace' ? <KspaceMenu content={content} compact={compact} /> : null}
      {domain === 'image' && (content === 'bad' || content === 'both') ? (
        <View>
          <Badge glyph="bad" word="bad image" tone="madder" />
        </View>
      ) : null}
      {domain === 'image' && (content === 'simulated' || content === 'both') ? (
        <View>
          <Badge glyph="simulated" word="simulated" tone="orchil" />
        </View>
      ) : null}
      {content === 'difference' ? <ColourBar kind="difference" low={`−${significant(span)}`} high={significant(span)} /> : null}
      {domain === 'kspace' && view.kspaceLook === 'phase' && content !== 'difference' ? <ColourBar kind="phase" low="−π" high="π" /> : null}
      {compact ? null : <View style={{ flexGrow: 1 }} />}
      <Text variant="small" tone="matInkSoft" numberOfLines={compact ? 2 : 1} style={{ flexShrink: 1 }}>
        {caution || (nBad > 1 ? `1 of ${nBad} bad images` : '')}
      </Text>
    </>
  );
}
