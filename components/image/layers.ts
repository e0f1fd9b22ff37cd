/** Which planes a pane shows, and which part of the picture each of them covers. */
import type { ColourTable } from './colour-table';
import type { DisplayPlane } from './display-plane';

/** A plane with the colours in which it is shown. */
export interface Shown {
  readonly plane: DisplayPlane;
  readonly table: ColourTable;
  readonly mask?: DisplayPlane | undefined;
}

export interface Layer extends Shown {
  readonly name: string;
  /** Part of the picture's width that this layer covers, 0 to 1. */
  readonly from: number;
  readonly to: number;
}

export type PaneContent = 'bad' | 'simulated' | 'both' | 'difference';

export type ShownOf = Readonly<Record<'bad' | 'simulated' | 'difference', Shown | null>>;

/** The layers of a pane. With both, the bad picture lies left of the divider (a fraction of the width), the simulated one right of it. */
export function layersOf(content: PaneContent, divider: number, { bad, simulated, difference }: ShownOf): Layer[] {
  const layer = (name: string, shown: Shown | null, from: number, to: number): Layer[] =>
    shown && to > from ? [{ name, ...shown, from, to }] : [];
  switch (content) {
    case 'bad':
      return layer('bad', bad, 0, 1);
    case 'simulated':
      return layer('simulated', simulated, 0, 1);
    case 'difference':
      return layer('difference', difference, 0, 1);
    case 'both':
      return [...layer('bad', bad, 0, divider), ...layer('simulated', simulated, divider, 1)];
  }
}
