/** Marks of the bad image: draw one, read the list, take one away. */
import { View } from 'react-native';
import { useRemoveMark } from '@/components/api/marks';
import { rulerMm, rulerPixels } from '@/components/image/mark-words';
import type { MarkKind } from '@/components/image/overlay-strokes';
import { GlyphButton } from '@/components/ui/glyph-button';
import { Notice } from '@/components/ui/notice';
import { fixed } from '@/components/ui/number-text';
import { Tabs, type Tab } from '@/components/ui/tabs';
import { Text } from '@/components/ui/text';
import { TextField } from '@/components/ui/text-field';
import { space, touchTarget } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import { EyeHeading } from './eye-heading';
import { useBench } from './bench-context';
import { MarkMeasure } from './mark-measure';
import { useLetteredMarks, type LetteredMark } from './use-marking';

type Tool = Exclude<MarkKind, 'polyline' | 'profile'> | 'none';
const tools: readonly Tab<Tool>[] = [
  { value: 'none', label: 'none' },
  { value: 'arrow', label: 'arrow' },
  { value: 'ellipse', label: 'ellipse' },
  { value: 'rectangle', label: 'box' },
  { value: 'ruler', label: 'ruler' },
  { value: 'text', label: 'text' },
];

const hints: Record<Tool, string> = {
  none: 'Choose a mark, then drag on a picture. By keyboard: Enter on the picture sets one end at the cursor, Enter again the other.',
  arrow: 'Drag from the tail to what it points at.',
  ellipse: 'Drag from one corner of its box to the other.',
  rectangle: 'Drag from one corner to the other.',
  ruler: 'Drag from one end to the other.',
  text: 'Write the words, then press where they belong. No names, no dates of birth.',
};

function detailOf({ kind, points, text, domain }: LetteredMark['mark'], spacingMm: readonly [number, number] | null): string {
  const measured =
    kind !== 'ruler'
      ? null
      : domain === 'image' && spacingMm
        ? `${rulerPixels(points)} px = ${fixed(rulerMm(points, spacingMm), 1)} mm`
        : `${rulerPixels(points)} px`;
  return [measured, text || null, domain === 'kspace' ? 'on k-space' : null].filter(Boolean).join(', ');
}

function MarkRow({ entry, onRemove }: { entry: LetteredMark; onRemove: () => void }) {
  const { colours } = useTheme();
  const { bad } = useBench();
  const { mark, letter } = entry;
  return (
    <View
      style={{
        flexDirection: 'row',
        alignItems: 'center',
        gap: space(3),
        minHeight: touchTarget,
        borderBottomWidth: 1,
        borderBottomColor: colours.rule,
      }}
    >
      <Text variant="labelStrong" tone="weld" style={{ width: 16 }}>
        {letter}
      </Text>
      <View style={{ flex: 1, minWidth: 0, paddingVertical: 4 }}>
        <View style={{ flexDirection: 'row', gap: space(2) }}>
          <Text variant="mono">{mark.kind}</Text>
          <Text variant="mono" tone="inkSoft" numberOfLines={1} style={{ marginLeft: 'auto', flexShrink: 1 }}>
            {detailOf(mark, bad.spacingMm)}
          </Text>
        </View>
        <MarkMeasure mark={mark} />
        <Text variant="small" tone="inkFaint">
          {mark.author.name}
        </Text>
      </View>
      <GlyphButton glyph="shut" label={`take mark ${letter} away`} onPress={onRemove} />
    </View>
  );
}

export function MarksTab() {
  const { kase, view, change } = useBench();
  const marks = useLetteredMarks();
  const remove = useRemoveMark(kase.id);
  const tool: Tool = view.tool === null || view.tool === 'polyline' || view.tool === 'profile' ? 'none' : view.tool;
  return (
    <View>
      <EyeHeading title="Marks" aside="on the bad image" />
      <View style={{ marginHorizontal: -12 }}>
        <Tabs label="mark to draw" tabs={tools} value={tool} onChange={(next) => change({ tool: next === 'none' ? null : next })} />
      </View>
      <Text variant="detail" tone="inkSoft" style={{ paddingVertical: space(2) }}>
        {hints[tool]}
      </Text>
      {tool === 'none' ? null : (
        <View style={{ paddingBottom: space(3) }}>
          <TextField
            label={tool === 'text' ? 'words' : 'words, if any'}
            value={view.markText}
            prose
            maxLength={400}
            onChange={(markText) => change({ markText })}
          />
        </View>
      )}
      {remove.error ? <Notice kind="failed" text={remove.error.message} /> : null}
      {marks.map((entry) => (
        <MarkRow key={entry.mark.id} entry={entry} onRemove={() => remove.mutate(entry.mark.id)} />
      ))}
      {marks.length === 0 ? (
        <Text variant="detail" tone="inkFaint" style={{ paddingVertical: space(2) }}>
          No mark yet.
        </Text>
      ) : null}
    </View>
  );
}
