/**
 * The sheet of a phone: grip, tabs, the chosen tab, and a footer with the numbers and the shuttle that never leaves. Dragged by its grip;
 * a press on a tab opens it, a press on the open tab closes it.
 */
import { useRef, useState, type KeyboardEvent, type PointerEvent } from 'react';
import { ScrollView, useWindowDimensions, View } from 'react-native';
import { Press } from '@/components/ui/press';
import { webStyle } from '@/components/ui/stitches';
import { Tabs, type Tab } from '@/components/ui/tabs';
import { Text } from '@/components/ui/text';
import { motion, radius, touchTarget } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import { nearestStep, sheetHeight, type SheetStep } from './bench-measures';
import type { EyeTab } from './bench-view';
import { useBench } from './bench-context';
import { EyeTabBody } from './eye';
import { NumbersLine } from './numbers-line';
import { RecipePanel } from './recipe-panel';
import { Shuttle } from './shuttle';
import { useLetteredMarks } from './use-marking';

interface BenchSheetProps {
  step: SheetStep;
  onStep: (step: SheetStep) => void;
}

const nextStep: Record<SheetStep, SheetStep> = { closed: 'half', half: 'full', full: 'closed' };
const gripThreads = Array.from({ length: 8 }, (_, i) => `M${1.5 + 7 * i} 0V8`).join('');

interface GripProps extends BenchSheetProps {
  onDrag: (height: number | null) => void;
}

function Grip({ step, onStep, onDrag }: GripProps) {
  const { colours } = useTheme();
  const screen = useWindowDimensions().height;
  const from = useRef<{ y: number; moved: boolean } | null>(null);
  const heightAt = (event: PointerEvent) => sheetHeight(step, screen) + ((from.current?.y ?? event.clientY) - event.clientY);
  return (
    <div
      role="button"
      tabIndex={0}
      aria-label={`sheet, ${step}: drag, or press to open it further`}
      onKeyDown={(event: KeyboardEvent) => {
        if (event.key !== 'Enter' && event.key !== ' ') return;
        event.preventDefault();
        onStep(nextStep[step]);
      }}
      onPointerDown={(event) => {
        event.currentTarget.setPointerCapture(event.pointerId);
        from.current = { y: event.clientY, moved: false };
      }}
      onPointerMove={(event) => {
        if (!from.current) return;
        from.current.moved ||= Math.abs(event.clientY - from.current.y) > 4;
        if (from.current.moved) onDrag(heightAt(event));
      }}
      onPointerUp={(event) => {
        const moved = from.current?.moved === true;
        const height = heightAt(event);
        from.current = null;
        onDrag(null);
        onStep(moved ? nearestStep(height, screen) : nextStep[step]);
      }}
      style={{ height: 16, display: 'flex', alignItems: 'center', justifyContent: 'center', touchAction: 'none', cursor: 'ns-resize' }}
    >
      <svg width={52} height={8} aria-hidden shapeRendering="crispEdges">
        <path d={gripThreads} stroke={colours.ruleStrong} />
      </svg>
    </div>
  );
}

function CompareFooter() {
  const { colours } = useTheme();
  const { view, change } = useBench();
  const { width } = useWindowDimensions();
  const isDifference = view.compare === 'difference';
  return (
    <View
      style={{ borderTopWidth: 1, borderTopColor: colours.rule, paddingHorizontal: 16, height: 82, backgroundColor: colours.clothRaised }}
    >
      <NumbersLine compact />
      <View style={{ flexDirection: 'row', alignItems: 'center', justifyContent: 'space-between', height: 48 }}>
        <Shuttle
          value={view.divider}
          onChange={(divider) => change({ divider, compare: 'divider' })}
          length={Math.max(72, Math.min(160, width - 292))}
        />
        <Press
          aria-label="diff: signed difference"
          aria-pressed={isDifference}
          onPress={() => change({ compare: isDifference ? 'divider' : 'difference' })}
          style={() => ({
            minWidth: 52,
            height: touchTarget,
            alignItems: 'center',
            justifyContent: 'center',
            borderWidth: isDifference ? 2 : 1,
            borderRadius: radius.control,
            borderColor: isDifference ? colours.indigo : colours.ruleStrong,
          })}
        >
          <Text variant={isDifference ? 'labelStrong' : 'mono'}>diff</Text>
        </Press>
      </View>
    </View>
  );
}

export function BenchSheet({ step, onStep }: BenchSheetProps) {
  const { colours } = useTheme();
  const { view, change } = useBench();
  const marks = useLetteredMarks();
  const screen = useWindowDimensions().height;
  const [dragged, setDragged] = useState<number | null>(null);
  const tabs: readonly Tab<EyeTab>[] = [
    { value: 'recipe', label: 'recipe' },
    { value: 'numbers', label: 'numbers' },
    { value: 'marks', label: 'marks', count: marks.length > 0 ? marks.length : undefined },
    { value: 'facts', label: 'facts' },
  ];
  const open = (tab: EyeTab): void => {
    onStep(step === 'closed' ? 'half' : view.tab === tab ? 'closed' : step);
    change({ tab });
  };
  return (
    <View
      style={[
        {
          position: 'absolute',
          left: 0,
          right: 0,
          bottom: 0,
          height: Math.max(sheetHeight('closed', screen), dragged ?? sheetHeight(step, screen)),
        },
        { backgroundColor: colours.clothRaised, borderTopWidth: 1, borderTopColor: colours.ruleStrong },
        dragged === null
          ? webStyle({ transitionProperty: 'height', transitionDuration: `${motion.sheet}ms`, transitionTimingFunction: 'linear' })
          : null,
      ]}
    >
      <Grip step={step} onStep={onStep} onDrag={setDragged} />
      <Tabs label="sheet" tabs={tabs} value={view.tab} onChange={open} even />
      <ScrollView style={{ flex: 1 }} contentContainerStyle={{ paddingHorizontal: 16, paddingBottom: 16 }}>
        {view.tab === 'recipe' ? <RecipePanel look="warp" ground="clothRaised" /> : <EyeTabBody tab={view.tab} />}
      </ScrollView>
      <CompareFooter />
    </View>
  );
}
