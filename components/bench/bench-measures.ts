/** Sizes of pictures on the bench: as large as the room allows, with the proportions of the image, on the 4-pixel grid. */
import { edgeThickness } from '@/components/image/pane-edge';
import { selvedgeWidth } from '@/components/ui/selvedge';

export interface PictureSize {
  readonly width: number;
  readonly height: number;
}

const grid = 4;
const smallest = 120;

/** The largest picture of this proportion (height over width) within the room. */
export function pictureSize(room: PictureSize, proportion: number): PictureSize {
  const width = Math.max(smallest, Math.min(room.width, room.height / proportion));
  const snapped = Math.floor(width / grid) * grid;
  return { width: snapped, height: Math.round(snapped * proportion) };
}

/** What a pane needs around its picture, pixels; the wider of ruler and ladder, so that nothing moves when the axis is set. */
export const paneMargins = {
  horizontal: edgeThickness('left', true) + selvedgeWidth,
  below: edgeThickness('bottom', true),
} as const;

/** Height over width of the field of view. */
export const proportionOf = ({ rows, columns, spacing }: { rows: number; columns: number; spacing: readonly [number, number] }): number =>
  (rows * spacing[0]) / (columns * spacing[1]);

/** Steps of the sheet on a phone: closed (tabs and compare footer), half, full under the header. */
export type SheetStep = 'closed' | 'half' | 'full';
export const closedSheet = 142;
const headerHeight = 44;

export function sheetHeight(step: SheetStep, screen: number): number {
  if (step === 'closed') return closedSheet;
  return step === 'full' ? screen - headerHeight : Math.round(screen * 0.46);
}

/** The step nearest to where the hand let the sheet go. */
export function nearestStep(height: number, screen: number): SheetStep {
  const steps: SheetStep[] = ['closed', 'half', 'full'];
  const distance = (step: SheetStep) => Math.abs(sheetHeight(step, screen) - height);
  return steps.reduce((best, step) => (distance(step) < distance(best) ? step : best));
}
