/**
 * A quantity on a ruled thread, on the web. The browser's range input lies unseen over the drawing and does the work: focus, arrow
 * keys, Page Up and Down, Home and End, the spoken value with its unit.
 */
import { useState } from 'react';
import { View } from 'react-native';
import { Glyph } from './glyph';
import { NumberInput } from './number-input';
import { decimalsOf, fixed, withMinus } from './number-text';
import type { SliderProps } from './slider';
import { SliderThread, thumbSide } from './slider-thread';
import { Text } from './text';
import { space, touchTarget } from './theme';
import { useTheme } from './theme-context';

/** The thumb of the unseen input is as wide as the drawn one, so that a press falls on the value beneath the finger. */
const rangeRules = `
.range { appearance: none; -webkit-appearance: none; background: transparent; margin: 0; opacity: 0; cursor: ew-resize; touch-action: pan-y; }
.range:disabled { cursor: default; }
.range::-webkit-slider-thumb { -webkit-appearance: none; width: ${thumbSide}px; height: ${touchTarget}px; }
.range::-moz-range-thumb { width: ${thumbSide}px; height: ${touchTarget}px; border: 0; }
`;

/** An end of the range without trailing zeros: it is read at a glance, beside the exact value. */
const shortest = (value: number): string => withMinus(String(Number(value.toFixed(4))));

/** Letters of label and unit that fit on one line with the value and the range; longer ones are set on two lines, without the range. */
const shortWords = 18;
const longLabel = { flex: 1, minWidth: 0, lineHeight: 14 } as const;

const fractionOf = (value: number, min: number, max: number): number =>
  max > min ? Math.min(1, Math.max(0, (value - min) / (max - min))) : 0;

export function Slider(props: SliderProps) {
  const { label, value, initial, min, max, step, unit, onChange, onLetGo, error, note, disabled = false } = props;
  const { colours } = useTheme();
  const [length, setLength] = useState(0);
  const [focused, setFocused] = useState(false);
  const [refused, setRefused] = useState<string | null>(null);
  const decimals = decimalsOf(step);
  const wrong = error ?? refused;
  const long = label.length + unit.length > shortWords;
  const change = (next: number): void => {
    setRefused(null);
    onChange(next);
  };
  return (
    <View>
      <View style={{ height: 52, paddingTop: 4 }} onLayout={({ nativeEvent }) => setLength(Math.round(nativeEvent.layout.width))}>
        <View
          style={{ flexDirection: 'row', alignItems: long ? 'center' : 'baseline', gap: space(2), zIndex: 1, pointerEvents: 'box-none' }}
        >
          <Text
            variant={long ? 'small' : 'mono'}
            numberOfLines={long ? 2 : 1}
            style={[{ pointerEvents: 'none' }, long ? longLabel : { flexShrink: 1 }]}
            aria-hidden
          >
            {label}
          </Text>
          {long ? null : (
            <Text variant="small" tone="inkFaint" style={{ pointerEvents: 'none', flex: 1, minWidth: 0 }} numberOfLines={1} aria-hidden>
              {`${shortest(min)} – ${shortest(max)}`}
            </Text>
          )}
          <NumberInput
            label={`${label}, ${unit}`}
            value={value}
            decimals={decimals}
            min={min}
            max={max}
            disabled={disabled}
            onRefused={setRefused}
            onChange={(next) => {
              change(next);
              onLetGo?.();
            }}
          />
          <Text variant="mono" tone="inkFaint" style={{ minWidth: 28, flexShrink: 0, pointerEvents: 'none' }} numberOfLines={1} aria-hidden>
            {unit}
          </Text>
        </View>
        <View style={{ position: 'absolute', left: 0, right: 0, top: 30, pointerEvents: 'none' }}>
          {length > 0 ? (
            <SliderThread
              length={length}
              from={fractionOf(initial, min, max)}
              at={fractionOf(value, min, max)}
              focused={focused}
              disabled={disabled}
            />
          ) : null}
        </View>
        <style href="range" precedence="component">
          {rangeRules}
        </style>
        <input
          type="range"
          className="range"
          title={`${label}, ${shortest(min)} to ${shortest(max)} ${unit}`.trim()}
          aria-label={label}
          aria-valuetext={`${fixed(value, decimals)} ${unit}`}
          aria-invalid={wrong ? true : undefined}
          min={min}
          max={max}
          step={step}
          value={value}
          disabled={disabled}
          onChange={(event) => change(Number(event.currentTarget.value))}
          onPointerUp={onLetGo}
          onKeyUp={onLetGo}
          onFocus={(event) => setFocused(event.currentTarget.matches(':focus-visible'))}
          onBlur={() => {
            setFocused(false);
            onLetGo?.();
          }}
          style={{ position: 'absolute', left: -thumbSide / 2, top: 17, width: `calc(100% + ${thumbSide}px)`, height: touchTarget }}
        />
      </View>
      {wrong ? (
        <View role="alert" style={{ flexDirection: 'row', gap: 6, paddingTop: space(1) }}>
          <Glyph name="danger" colour={colours.madder} size={14} />
          <Text variant="small" tone="madder" style={{ flexShrink: 1 }}>
            {wrong}
          </Text>
        </View>
      ) : note ? (
        <Text variant="caption" tone="inkFaint" style={{ paddingTop: 2 }}>
          {note}
        </Text>
      ) : null}
    </View>
  );
}
