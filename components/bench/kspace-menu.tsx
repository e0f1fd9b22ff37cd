/** Which k-space, and which side of it: a word that opens a menu. What is of the image and what was acquired have different names. */
import { useRef, useState } from 'react';
import { View } from 'react-native';
import type { PaneContent } from '@/components/image/layers';
import { Glyph } from '@/components/ui/glyph';
import { anchorOf, Menu, type Anchor, type MenuRow } from '@/components/ui/menu';
import { Press } from '@/components/ui/press';
import { insideBar } from '@/components/ui/stitches';
import { Text } from '@/components/ui/text';
import { useTheme } from '@/components/ui/theme-context';
import { useBench } from './bench-context';
import type { BenchView } from './bench-view';

type Choice = Pick<BenchView, 'kspaceLook' | 'kspaceOf'>;

const choices: Record<string, Choice & { label: string; aside: string }> = {
  'image log': { kspaceOf: 'image', kspaceLook: 'log', label: 'log size', aside: 'of the image' },
  'image phase': { kspaceOf: 'image', kspaceLook: 'phase', label: 'phase', aside: 'of the image' },
  'acquired log': { kspaceOf: 'acquired', kspaceLook: 'log', label: 'log size', aside: 'as acquired' },
  'acquired phase': { kspaceOf: 'acquired', kspaceLook: 'phase', label: 'phase', aside: 'as acquired' },
};
const rows: MenuRow[] = Object.entries(choices).map(([id, { label, aside }]) => ({ id, label, aside }));

export function KspaceMenu({ content, compact }: { content: PaneContent; compact: boolean }) {
  const { colours } = useTheme();
  const { view, change } = useBench();
  const trigger = useRef<View>(null);
  const [anchor, setAnchor] = useState<Anchor | null>(null);
  const chosen = `${view.kspaceOf} ${view.kspaceLook}`;
  const close = (): void => setAnchor(null);
  const look = content === 'difference' || view.kspaceLook === 'log' ? (compact ? 'log' : 'log size') : 'phase';
  const words = `k-space, ${look}`;
  return (
    <View ref={trigger}>
      <Press
        aria-label={`${words}: choose`}
        aria-expanded={anchor !== null}
        {...{ 'aria-haspopup': 'menu' }}
        onPress={() => setAnchor(anchorOf(trigger.current))}
        style={({ hovered }) => [
          { height: 32, flexDirection: 'row', alignItems: 'center', gap: 6 },
          hovered ? insideBar('bottom', 2, colours.indigo) : null,
        ]}
      >
        <Text variant="mono" tone="matInk" numberOfLines={1}>
          {words}
        </Text>
        <Glyph name="down" size={12} colour={colours.matInk} />
      </Press>
      {anchor ? (
        <Menu
          label="k-space"
          anchor={anchor}
          rows={rows}
          chosen={chosen}
          onClose={close}
          onChoose={(id) => {
            close();
            const choice = choices[id];
            if (choice) change({ kspaceLook: choice.kspaceLook, kspaceOf: choice.kspaceOf });
          }}
        />
      ) : null}
    </View>
  );
}
