/** What the strength of a swatch stands for: each quantity that it moves, at its value, with its unit. */
import { decimalsOf, fixed } from '@/components/ui/number-text';
import type { CatalogueEntry } from '@/server/contract/catalogue';

/** The same line and step as the server draws with. */
export const movedWords = ({ strength: moved }: Pick<CatalogueEntry, 'strength'>, strength: number): string =>
  moved
    .map(({ label, unit, min, max, step, mild, strong }) => {
      const onStep = min + Math.round((mild + strength * (strong - mild) - min) / step) * step;
      const value = fixed(Math.min(max, Math.max(min, onStep)), decimalsOf(step));
      return `${label.charAt(0).toLowerCase()}${label.slice(1)} ${value} ${unit}`.trim();
    })
    .join(' · ');
