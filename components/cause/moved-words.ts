/** What the strength of a swatch stands for: each quantity that it moves, at its value, with its unit. */
import { decimalsOf, fixed } from '@/components/ui/number-text';
import type { Cause } from '@/server/contract/catalogue';

/** The same line and step as the server draws with. */
export function movedWords({ parameters, strength: ends }: Cause, strength: number): string {
  const words = parameters.flatMap((parameter) => {
    const moved = ends[parameter.id];
    if (!moved || 'options' in parameter) return [];
    const { min, max, step, unit, label } = parameter;
    const [mild, strong] = moved;
    const onStep = min + Math.round((mild + strength * (strong - mild) - min) / step) * step;
    return [
      `${label.charAt(0).toLowerCase()}${label.slice(1)} ${fixed(Math.min(max, Math.max(min, onStep)), decimalsOf(step))} ${unit}`.trim(),
    ];
  });
  return words.join(' · ');
}
