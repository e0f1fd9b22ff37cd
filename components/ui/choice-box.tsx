/** The small figure of a choice: a lozenge for one of a few, a square for many; filled when chosen, stitched when it cannot be. */
import { useTheme } from './theme-context';

interface ChoiceBoxProps {
  many: boolean;
  on: boolean;
  disabled?: boolean;
  size?: number;
}

export function ChoiceBox({ many, on, disabled = false, size = 16 }: ChoiceBoxProps) {
  const { colours } = useTheme();
  const ink = on && !disabled ? colours.indigo : colours.ruleStrong;
  return (
    <svg width={size} height={size} viewBox="0 0 16 16" fill="none" aria-hidden style={{ flex: 'none', display: 'block' }}>
      <path
        d={many ? 'M1.75 1.75H14.25V14.25H1.75Z' : 'M8 1L15 8L8 15L1 8Z'}
        stroke={ink}
        strokeWidth={1.5}
        strokeDasharray={disabled ? '3 2' : undefined}
      />
      {on ? <path d={many ? 'M4 4H12V12H4Z' : 'M8 4.2L11.8 8L8 11.8L4.2 8Z'} fill={disabled ? colours.inkFaint : ink} /> : null}
    </svg>
  );
}
