/** Words to search for. The list follows a quarter of a second after the last key. */
import { useEffect, useRef, useState } from 'react';
import { TextInput, View } from 'react-native';
import { Glyph } from '@/components/ui/glyph';
import { GlyphButton } from '@/components/ui/glyph-button';
import { textVariants } from '@/components/ui/text';
import { space, touchTarget } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';

interface SearchFieldProps {
  value: string;
  onSearch: (words: string) => void;
  autoFocus?: boolean;
  /** What is searched, as it is spoken. */
  label?: string;
  placeholder?: string;
}

const ofCases = { label: 'search the cases', placeholder: 'number, words, scanner, coil' };

const restMs = 250;

export function SearchField({ value, onSearch, autoFocus = false, ...words }: SearchFieldProps) {
  const { colours } = useTheme();
  const { label, placeholder } = { ...ofCases, ...words };
  const [typed, setTyped] = useState(value);
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);
  useEffect(() => () => clearTimeout(timer.current), []);
  const type = (text: string): void => {
    setTyped(text);
    clearTimeout(timer.current);
    timer.current = setTimeout(() => onSearch(text.trim()), restMs);
  };
  return (
    <View
      style={{
        flex: 1,
        maxWidth: 520,
        height: touchTarget,
        flexDirection: 'row',
        alignItems: 'center',
        gap: space(3),
        borderBottomWidth: 1,
        borderBottomColor: colours.ruleStrong,
      }}
    >
      <Glyph name="search" colour={colours.ink} />
      <TextInput
        value={typed}
        onChangeText={type}
        autoFocus={autoFocus}
        placeholder={placeholder}
        aria-label={label}
        inputMode="search"
        style={[textVariants.detail, { flex: 1, height: 40, minWidth: 0, color: colours.ink }]}
      />
      {typed ? <GlyphButton glyph="shut" label="clear the search" onPress={() => type('')} /> : null}
    </View>
  );
}
