/** Words that lead somewhere or do something small: indigo, underlined, in a target a finger can hit. */
import type { Href } from 'expo-router';
import { Press } from './press';
import { Text, type TextVariant } from './text';
import { touchTarget } from './theme';

interface LinkTextProps {
  label: string;
  onPress?: () => void;
  href?: Href;
  variant?: TextVariant;
  /** What is spoken where the word alone says too little. */
  name?: string;
}

export function LinkText({ label, onPress, href, variant = 'small', name }: LinkTextProps) {
  return (
    <Press onPress={onPress} href={href} aria-label={name ?? label} style={() => ({ minHeight: touchTarget, justifyContent: 'center' })}>
      {({ hovered }) => (
        <Text
          variant={variant}
          tone="indigo"
          style={{ textDecorationLine: 'underline', textDecorationStyle: hovered ? 'double' : 'solid' }}
        >
          {label}
        </Text>
      )}
    </Press>
  );
}
