/**
 * One of a few (a lozenge) or some of a few (a square). Space and Enter choose; in a one-of the arrows move the choice, as in
 * every radio group, and only the chosen one is in the tab order.
 */
import { useId, useRef, type KeyboardEvent } from 'react';
import { View, type DimensionValue } from 'react-native';
import { ChoiceBox } from './choice-box';
import { Press } from './press';
import { insideBar } from './stitches';
import { Text } from './text';
import { space, touchTarget } from './theme';
import { useTheme } from './theme-context';

export interface ChoiceOption<Value extends string> {
  readonly value: Value;
  readonly label: string;
}

type Selection<Value extends string> =
  | { many?: false; value: Value | null; onChange: (value: Value) => void }
  | { many: true; value: readonly Value[]; onChange: (value: Value[]) => void };

export type ChoiceProps<Value extends string> = Selection<Value> & {
  label: string;
  options: readonly ChoiceOption<Value>[];
  columns?: number;
  /** A word at the right of the label. */
  aside?: string;
};

const arrows: Record<string, number> = { ArrowDown: 1, ArrowRight: 1, ArrowUp: -1, ArrowLeft: -1 };

export function Choice<Value extends string>(props: ChoiceProps<Value>) {
  const { label, options, columns = 1, aside } = props;
  const { colours } = useTheme();
  const id = useId();
  const group = useRef<View>(null);
  const chosen = (value: Value): boolean => (props.many ? props.value.includes(value) : props.value === value);
  const press = (value: Value): void => {
    if (!props.many) props.onChange(value);
    else props.onChange(chosen(value) ? props.value.filter((other) => other !== value) : [...props.value, value]);
  };
  const move = (event: KeyboardEvent, index: number): void => {
    const step = props.many ? undefined : arrows[event.key];
    if (step === undefined) return;
    event.preventDefault();
    const next = (index + step + options.length) % options.length;
    const option = options[next];
    if (option) press(option.value);
    const radios = (group.current as unknown as HTMLElement | null)?.querySelectorAll<HTMLElement>('[role=radio]');
    radios?.[next]?.focus();
  };
  const nothingChosen = !options.some((option) => chosen(option.value));
  const width: DimensionValue = `${100 / columns}%`;
  return (
    <View>
      <View style={{ flexDirection: 'row', alignItems: 'baseline', justifyContent: 'space-between' }}>
        <Text variant="heading" nativeID={id}>
          {label}
        </Text>
        {aside ? (
          <Text variant="small" tone="inkFaint">
            {aside}
          </Text>
        ) : null}
      </View>
      <View ref={group} role={props.many ? 'group' : 'radiogroup'} aria-labelledby={id} style={{ flexDirection: 'row', flexWrap: 'wrap' }}>
        {options.map((option, index) => {
          const on = chosen(option.value);
          const alone = columns > 1 && index === options.length - 1 && options.length % columns === 1;
          return (
            <Press
              key={option.value}
              role={props.many ? 'checkbox' : 'radio'}
              aria-checked={on}
              aria-label={option.label}
              pressOnSpace
              tabIndex={props.many || on || (nothingChosen && index === 0) ? 0 : -1}
              onPress={() => press(option.value)}
              onKeyDown={(event) => move(event, index)}
              style={({ hovered }) => [
                { width: alone ? '100%' : width, minHeight: touchTarget, flexDirection: 'row', alignItems: 'center', gap: space(2) },
                { borderBottomWidth: 1, borderBottomColor: colours.rule },
                hovered ? insideBar('bottom', 2, colours.indigo) : null,
              ]}
            >
              <ChoiceBox many={props.many ?? false} on={on} />
              <Text variant={on ? 'labelStrong' : 'mono'} tone={on ? 'ink' : 'inkSoft'} style={{ letterSpacing: -0.26 }}>
                {option.label}
              </Text>
            </Press>
          );
        })}
      </View>
    </View>
  );
}
