/** Progress: the laid part solid indigo with a needle at its end, the rest stitched; a sentence says what and how many. */
import { View } from 'react-native';
import { Text } from './text';
import { space } from './theme';
import { useTheme } from './theme-context';

interface ProgressThreadProps {
  /** 0 to 1. */
  done: number;
  sentence: string;
}

export function ProgressThread({ done, sentence }: ProgressThreadProps) {
  const { colours } = useTheme();
  const end = Math.max(0, Math.min(1, done)) * 100;
  return (
    <View
      role="progressbar"
      aria-label={sentence}
      aria-valuemin={0}
      aria-valuemax={100}
      aria-valuenow={Math.round(end)}
      style={{ gap: space(1) }}
    >
      <svg width="100%" height={12} aria-hidden style={{ display: 'block' }}>
        <line x1={`${end}%`} y1={6} x2="100%" y2={6} stroke={colours.ruleStrong} strokeDasharray="4 3" />
        <line x1={0} y1={6} x2={`${end}%`} y2={6} stroke={colours.indigo} strokeWidth={2} />
        <svg x={`${end}%`} overflow="visible">
          <path d="M-8 2L0 6L-8 10Z" fill={colours.indigo} />
        </svg>
      </svg>
      <Text variant="small">{sentence}</Text>
    </View>
  );
}
