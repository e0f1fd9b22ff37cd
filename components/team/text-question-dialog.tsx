/** The question about a text that looks like a patient's: kept as it is, or changed first. */
import { useTextQuestion } from '@/components/api/text-question';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Text } from '@/components/ui/text';

const longestQuote = 200;

export function TextQuestionDialog() {
  const asked = useTextQuestion();
  if (asked === null) return null;
  const { text, question, answer } = asked;
  const quote = text.length > longestQuote ? `${text.slice(0, longestQuote)}…` : text;
  return (
    <Dialog
      title="Keep this text?"
      text={question}
      onClose={() => answer(false)}
      actions={
        <>
          <Button label="keep it" onPress={() => answer(true)} />
          <Button label="change it" kind="first" grow onPress={() => answer(false)} />
        </>
      }
    >
      <Text variant="mono">{quote}</Text>
    </Dialog>
  );
}
