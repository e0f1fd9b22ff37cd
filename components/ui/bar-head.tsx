/** The 44-pixel head of a screen that was come to from another: the way back, where this is, and what stands at the right. */
import type { Href } from 'expo-router';
import type { ReactNode } from 'react';
import { View } from 'react-native';
import { GlyphButton } from './glyph-button';
import { Text } from './text';
import { space, touchTarget } from './theme';

interface BarHeadProps {
  back: Href;
  backLabel: string;
  /** `shut` leaves something unfinished, `left` goes back. */
  backGlyph?: 'left' | 'shut';
  title: string;
  /** The words are the place, not the title of the page. */
  faint?: boolean;
  level?: 1 | 2;
  end?: ReactNode;
}

export function BarHead({ back, backLabel, backGlyph = 'left', title, faint = false, level, end }: BarHeadProps) {
  return (
    <View style={{ height: touchTarget, paddingHorizontal: space(1), flexDirection: 'row', alignItems: 'center' }}>
      <GlyphButton glyph={backGlyph} label={backLabel} href={back} />
      <Text variant={faint ? 'mono' : 'labelStrong'} tone={faint ? 'inkFaint' : 'ink'} {...(level ? { level } : {})}>
        {title}
      </Text>
      <View style={{ marginLeft: 'auto', flexDirection: 'row', alignItems: 'center' }}>{end}</View>
    </View>
  );
}
