/**
 * A field: its label above, its frame, and under it what concerns it: an error with a triangle (the permitted range, in words),
 * or where a value came from; or a question about it. A value from the header has a stitched frame until somebody changes it.
 */
import { useId, useState } from 'react';
import { TextInput, View, type TextInputProps } from 'react-native';
import { Glyph } from './glyph';
import { LinkText } from './link-text';
import { insideBar } from './stitches';
import { Text, textVariants } from './text';
import { radius, space, type Colours } from './theme';
import { useTheme } from './theme-context';

export interface TextFieldProps {
  label: string;
  value: string;
  onChange: (text: string) => void;
  error?: string | undefined;
  /** A word on where the value came from or what is expected. */
  note?: string | undefined;
  fromHeader?: boolean;
  /** Something about the text is doubted (a name?): asked in weld, with a way to keep it. It does not stand in the way. */
  question?: { text: string; onKeep: () => void } | undefined;
  lines?: number;
  /** Sentences are set in the sans, values in the mono. */
  prose?: boolean;
  placeholder?: string;
  secret?: boolean;
  disabled?: boolean;
  maxLength?: number;
  autoFocus?: boolean;
  input?: Pick<TextInputProps, 'autoComplete' | 'inputMode' | 'onSubmitEditing' | 'onBlur' | 'spellCheck' | 'autoCapitalize'>;
}

const frameOf = (colours: Colours, { error, fromHeader, disabled }: TextFieldProps) => ({
  borderColor: error ? colours.madder : colours.ruleStrong,
  borderWidth: error ? 2 : 1,
  borderStyle: fromHeader || disabled ? ('dashed' as const) : ('solid' as const),
  backgroundColor: fromHeader || disabled ? 'transparent' : colours.clothRaised,
});

export function TextField(props: TextFieldProps) {
  const { label, value, onChange, error, note, question, lines = 1, prose = false, disabled = false } = props;
  const { colours } = useTheme();
  const id = useId();
  const [height, setHeight] = useState(0);
  const minimum = lines > 1 ? lines * 24 + 22 : 46;
  return (
    <View style={{ gap: space(1) }}>
      <Text variant="small" tone="inkSoft" nativeID={`${id}-label`}>
        {label}
      </Text>
      <View
        {...{ dataSet: { field: 'true' } }}
        style={[{ borderRadius: radius.control }, frameOf(colours, props), question ? insideBar('bottom', 2, colours.weldThread) : null]}
      >
        <TextInput
          value={value}
          onChangeText={onChange}
          aria-labelledby={`${id}-label`}
          aria-disabled={disabled}
          {...{ 'aria-invalid': Boolean(error), 'aria-describedby': `${id}-note` }}
          editable={!disabled}
          multiline={lines > 1}
          onContentSizeChange={(event) => setHeight(event.nativeEvent.contentSize.height)}
          secureTextEntry={props.secret ?? false}
          placeholder={props.placeholder}
          maxLength={props.maxLength}
          autoFocus={props.autoFocus ?? false}
          {...props.input}
          style={[
            textVariants[prose ? 'sans' : 'mono'],
            { fontSize: 16, lineHeight: 24, color: disabled ? colours.inkFaint : colours.ink },
            {
              minHeight: minimum,
              paddingHorizontal: space(3),
              paddingVertical: 10,
              height: lines > 1 ? Math.max(minimum, height) : minimum,
            },
          ]}
        />
      </View>
      {question && !error ? (
        <View role="status" style={{ flexDirection: 'row', alignItems: 'center', gap: 6 }}>
          <Glyph name="note" colour={colours.weld} size={14} />
          <Text variant="small" tone="weld" style={{ flexShrink: 1 }}>
            {question.text}
          </Text>
          <LinkText label="keep it" onPress={question.onKeep} />
        </View>
      ) : null}
      {error || note ? (
        <View nativeID={`${id}-note`} role={error ? 'alert' : undefined} style={{ flexDirection: 'row', gap: 6, paddingTop: 2 }}>
          {error ? <Glyph name="danger" colour={colours.madder} size={14} /> : null}
          <Text variant="small" tone={error ? 'madder' : 'inkSoft'} style={{ flexShrink: 1 }}>
            {error ?? note}
          </Text>
        </View>
      ) : null}
    </View>
  );
}
