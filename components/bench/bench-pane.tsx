/** One pane of the bench: a domain under the compare mode, with its window, cursor, marks and readout. */
import { useMemo, useRef, type ReactNode } from 'react';
import type { Domain } from '@/components/image/edge-scale';
import { kspaceGrid } from '@/components/image/kspace-grid';
import { layersOf } from '@/components/image/layers';
import { Pane } from '@/components/image/pane';
import { dragWindow, type Window } from '@/components/image/window-level';
import { useBench } from './bench-context';
import { contentOf } from './pane-content';
import { PaneHead } from './pane-head';
import { useMarking } from './use-marking';

interface BenchPaneProps {
  domain: Domain;
  width: number;
  height: number;
  /** Which picture this pane shows when they lie side by side. */
  side?: 'bad' | 'simulated';
  headHeight?: number;
  withoutHead?: boolean;
  readout?: ReactNode;
}

const spoken = {
  bad: 'bad image',
  simulated: 'simulated image',
  both: 'bad image and simulated image',
  difference: 'bad minus simulated',
} as const;

/** Drags change the window of what is shown: grey values, decades of k-space, or the span of a difference. Phase has no window. */
function useWindowDrag(domain: Domain, isDifference: boolean) {
  const { view, change } = useBench();
  const start = useRef<{ window: Window; span: number } | null>(null);
  const names = domain === 'image' ? (['imageWindow', 'differenceSpan'] as const) : (['logWindow', 'logDifferenceSpan'] as const);
  return {
    onWindowStart: () => {
      start.current = { window: view[names[0]], span: view[names[1]] };
    },
    onWindowDrag: (right: number, down: number) => {
      if (!start.current) return;
      if (isDifference) change({ [names[1]]: start.current.span * Math.max(0.01, 1 + right) });
      else change({ [names[0]]: dragWindow(start.current.window, right, down) });
    },
    onWindowEnd: () => {
      start.current = null;
    },
  };
}

export function BenchPane({ domain, width, height, side = 'bad', headHeight, withoutHead = false, readout }: BenchPaneProps) {
  const { view, change, bad, frame, phaseEncode, shown, blinksToBad } = useBench();
  // Without a phase-encode axis nothing is simulated: the bad picture stands alone.
  const content = phaseEncode === null ? 'bad' : contentOf(domain, view, side, blinksToBad, bad);
  const grid = useMemo(() => (domain === 'image' ? frame : kspaceGrid(frame)), [domain, frame]);
  const layers = useMemo(() => layersOf(content, view.divider, shown[domain]), [content, view.divider, shown, domain]);
  const marking = useMarking(domain);
  const drag = useWindowDrag(domain, content === 'difference');
  return (
    <Pane
      domain={domain}
      phaseEncode={phaseEncode}
      simulated={content !== 'bad'}
      label={`${domain === 'kspace' ? 'k-space of ' : ''}${spoken[content]}`}
      width={width}
      height={height}
      frame={grid}
      layers={layers}
      region={view.regions[domain]}
      onRegion={(region) => change({ regions: { ...view.regions, [domain]: region } })}
      cursor={view.cursor}
      onCursor={(cursor) => {
        change({ cursor });
        marking.onPress(cursor);
      }}
      divider={content === 'both' ? view.divider : null}
      marks={marking.marks}
      onDraw={marking.onDraw}
      onEnter={marking.onEnter}
      {...drag}
      head={withoutHead ? null : <PaneHead domain={domain} content={content} />}
      headHeight={headHeight}
      readout={readout}
    />
  );
}
