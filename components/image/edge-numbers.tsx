/** Numbers and words along an edge, in the faint and the full ink of the mat. */
import { fonts } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { Tick } from './ticks';

const numberSize = 11;
/** Width of a character of the mono at 11 pixels. */
export const characterWidth = 6.6;

const numberText = (value: number): string => String(Number(value.toFixed(6))).replace('-', '\u2212');
export const widestNumber = (ticks: readonly Tick[]): number =>
  Math.max(1, ...ticks.filter(({ isMajor }) => isMajor).map(({ value }) => numberText(value).length)) * characterWidth;

interface EdgeNumbersProps {
  side: 'left' | 'bottom';
  ticks: readonly Tick[];
  words: string;
  length: number;
  /** Distance of the numbers, and of the words, from the outer side of the edge (left) or from the picture (bottom). */
  numbersAt: number;
  wordsAt: number;
}

export function EdgeNumbers({ side, ticks, words, length, numbersAt, wordsAt }: EdgeNumbersProps) {
  const { colours } = useTheme();
  const upright = side === 'left';
  return (
    <g fontFamily={fonts.mono} fontSize={numberSize} fill={colours.matInkSoft} letterSpacing={-0.1}>
      {ticks.map(({ at, value }) => (
        <text key={value} x={upright ? numbersAt : at} y={upright ? at + 4 : numbersAt} textAnchor={upright ? 'end' : 'middle'}>
          {numberText(value)}
        </text>
      ))}
      <text
        fill={colours.matInk}
        textAnchor="middle"
        transform={upright ? `translate(${wordsAt} ${length / 2}) rotate(-90)` : `translate(${length / 2} ${wordsAt})`}
      >
        {words}
      </text>
    </g>
  );
}
