/**
 * The shuttle: left end the bad picture, right end the simulated one; the shuttle itself is the divider. A press on an end shows that
 * picture alone; held down, it shows it for as long as it is held. Arrows move the shuttle.
 */
import { useRef, useState, type KeyboardEvent, type PointerEvent } from 'react';
import { View } from 'react-native';
import { Glyph } from '@/components/ui/glyph';
import { Press } from '@/components/ui/press';
import { Text } from '@/components/ui/text';
import { touchTarget } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';

interface ShuttleProps {
  /** Fraction of the picture that is bad, from the left. */
  value: number;
  onChange: (value: number) => void;
  length: number;
}

const holdMs = 350;
const keyStep: Record<string, number> = { ArrowLeft: -0.02, ArrowRight: 0.02, PageDown: -0.1, PageUp: 0.1 };
const bounded = (value: number): number => Math.min(1, Math.max(0, value));

/** Half of the shuttle's length: its middle stays inside the thread. */
const half = 22;

function ShuttleThread({ value, onChange, length }: ShuttleProps) {
  const { colours } = useTheme();
  const thread = useRef<SVGSVGElement>(null);
  const isHeld = useRef(false);
  const x = half + value * (length - 2 * half);
  const follow = (event: PointerEvent<SVGSVGElement>): void => {
    const left = thread.current?.getBoundingClientRect().left ?? 0;
    onChange(bounded((event.clientX - left - half) / (length - 2 * half)));
  };
  const onKeyDown = (event: KeyboardEvent): void => {
    const step = keyStep[event.key];
    const next = event.key === 'Home' ? 0 : event.key === 'End' ? 1 : step === undefined ? null : bounded(value + step);
    if (next === null) return;
    event.preventDefault();
    onChange(next);
  };
  return (
    <svg
      ref={thread}
      width={length}
      height={touchTarget}
      role="slider"
      tabIndex={0}
      aria-label="divider between the bad and the simulated picture"
      aria-valuemin={0}
      aria-valuemax={100}
      aria-valuenow={Math.round(value * 100)}
      aria-valuetext={`${Math.round(value * 100)} % bad`}
      onKeyDown={onKeyDown}
      onPointerDown={(event) => {
        event.currentTarget.setPointerCapture(event.pointerId);
        isHeld.current = true;
        follow(event);
      }}
      onPointerMove={(event) => {
        if (isHeld.current) follow(event);
      }}
      onPointerUp={() => {
        isHeld.current = false;
      }}
      style={{ display: 'block', flex: 'none', overflow: 'visible', touchAction: 'none', cursor: 'ew-resize' }}
    >
      <path d={`M0 22H${x}`} stroke={colours.madder} strokeWidth={2} />
      <path d={`M${x} 22H${length}`} stroke={colours.orchil} strokeWidth={2} strokeDasharray="4 3" />
      <path d="M1 16V28" stroke={colours.madder} strokeWidth={2} />
      <path d={`M${length - 1} 16V28`} stroke={colours.orchil} strokeWidth={2} />
      <path
        d={`M${x - half} 22L${x - 10} 12H${x + 10}L${x + half} 22L${x + 10} 32H${x - 10}Z`}
        fill={colours.cloth}
        stroke={colours.ink}
        strokeWidth={1.5}
      />
      <path d={`M${x - 4} 17V27M${x} 17V27M${x + 4} 17V27`} stroke={colours.ink} strokeWidth={1.5} />
    </svg>
  );
}

interface EndProps {
  picture: 'bad' | 'simulated';
  to: 0 | 1;
  value: number;
  onChange: (value: number) => void;
}

function End({ picture, to, value, onChange }: EndProps) {
  const { colours } = useTheme();
  const tone = picture === 'bad' ? 'madder' : 'orchil';
  const [held, setHeld] = useState<{ from: number; since: number } | null>(null);
  return (
    <Press
      aria-label={`the ${picture} picture alone; hold to see it for as long as you hold`}
      onPress={() => onChange(to)}
      onPressIn={() => {
        setHeld({ from: value, since: performance.now() });
        onChange(to);
      }}
      onPressOut={() => {
        if (held && performance.now() - held.since > holdMs) requestAnimationFrame(() => onChange(held.from));
        setHeld(null);
      }}
      style={() => ({ minWidth: touchTarget, minHeight: touchTarget, justifyContent: 'center' })}
    >
      <View style={{ flexDirection: to === 1 ? 'row' : 'row-reverse', alignItems: 'center', gap: 6 }}>
        <Glyph name={picture} colour={colours[tone]} />
        <Text variant="small" tone={tone}>
          {picture}
        </Text>
      </View>
    </Press>
  );
}

export function Shuttle(props: ShuttleProps) {
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: 12 }}>
      <End picture="bad" to={1} value={props.value} onChange={props.onChange} />
      <ShuttleThread {...props} />
      <End picture="simulated" to={0} value={props.value} onChange={props.onChange} />
    </View>
  );
}
