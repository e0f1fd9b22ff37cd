/** Files that were not taken: a few are read one by one, those of a folder are summed up by what they are. */
import { View } from 'react-native';
import { Badge } from '@/components/ui/badge';
import { Button } from '@/components/ui/button';
import { Text } from '@/components/ui/text';
import { gutter, space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import { RefusalCard } from '../new/refusal-card';
import { refusalTitles } from '../new/refusal-words';
import { readOneByOne, sumRefusals } from './batches';
import type { Intake } from './use-intake';

export function Refusals({ intake }: { intake: Intake }) {
  const { refused, leaveOut, leaveOutAll, take } = intake;
  if (refused.length > readOneByOne) return <RefusalSums intake={intake} onLeaveOut={leaveOutAll} />;
  return refused.map((refusal, index) => (
    <RefusalCard
      key={`${refusal.name} ${index}`}
      refusal={refusal}
      onLeaveOut={() => leaveOut(refusal)}
      onChooseAnother={(files) => {
        leaveOut(refusal);
        take(files);
      }}
    />
  ));
}

const filesWord = (count: number): string => (count === 1 ? '1 file' : `${count} files`);

function RefusalSums({ intake: { refused }, onLeaveOut }: { intake: Intake; onLeaveOut: () => void }) {
  const { colours } = useTheme();
  return (
    <View
      role="alert"
      style={{
        padding: gutter.phone,
        paddingLeft: gutter.phone - 3,
        backgroundColor: colours.clothRaised,
        borderBottomWidth: 1,
        borderBottomColor: colours.rule,
        borderLeftWidth: 3,
        borderLeftColor: colours.madder,
      }}
    >
      <View style={{ flexDirection: 'row', alignItems: 'center', justifyContent: 'space-between' }}>
        <Badge glyph="danger" word={`${filesWord(refused.length)} refused`} tone="madder" strong />
        <Button label="leave them out" kind="plain" onPress={onLeaveOut} />
      </View>
      {sumRefusals(refused).map(({ code, count, reason }) => (
        <View key={code} style={{ paddingTop: space(2) }}>
          <Text variant="detailStrong">
            {filesWord(count)}: {refusalTitles[code]}
          </Text>
          <Text variant="detail" tone="inkSoft">
            {reason}
          </Text>
        </View>
      ))}
      <Text variant="detail" tone="inkSoft" style={{ paddingTop: space(2) }}>
        Nothing of these files was kept.
      </Text>
    </View>
  );
}
