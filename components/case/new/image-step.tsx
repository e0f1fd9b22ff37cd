/** Step 1: the scanner and the images. The header fills in what it can; files that were refused say why. */
import { View } from 'react-native';
import { Notice } from '@/components/ui/notice';
import { ProgressThread } from '@/components/ui/progress-thread';
import { Text } from '@/components/ui/text';
import { TextField } from '@/components/ui/text-field';
import { gutter, space } from '@/components/ui/theme';
import { useLayout } from '@/components/ui/use-layout';
import type { Suggestion } from './draft';
import { DropArea } from './drop-area';
import { FileButton } from './file-button';
import { RefusalCard } from './refusal-card';
import { ScannerBand } from './scanner-band';
import { TakenImage } from './taken-image';
import type { DraftForm } from './use-draft';
import type { useIntake } from './use-intake';

interface ImageStepProps {
  form: DraftForm;
  intake: ReturnType<typeof useIntake>;
  suggestion: Suggestion;
  scannerFromHeader: boolean;
}

export function ImageStep({ form, intake, suggestion, scannerFromHeader }: ImageStepProps) {
  const wide = useLayout() === 'wide';
  const { draft, change, errors } = form;
  const title = draft.title ?? suggestion.title;
  const choose = (
    <>
      <View style={{ flexDirection: 'row', gap: space(2) }}>
        <FileButton
          label={draft.images.length > 0 ? 'add a file' : 'choose a file'}
          grow
          busy={intake.progress?.done ?? false}
          onFiles={intake.take}
        />
      </View>
      {intake.progress ? <ProgressThread {...intake.progress} /> : null}
      {intake.failure ? <Notice kind="failed" text={intake.failure.message} /> : null}
      <Text variant="detail" tone="inkSoft">
        {wide ? 'Or drop DICOM files here. ' : ''}Names, numbers and dates are taken out while an image is read. A photograph of the screen
        is refused: it shows names.
      </Text>
    </>
  );
  return (
    <View>
      {intake.refused.map((refusal, index) => (
        <RefusalCard
          key={`${refusal.name} ${index}`}
          refusal={refusal}
          onLeaveOut={() => intake.leaveOut(refusal)}
          onChooseAnother={(files) => {
            intake.leaveOut(refusal);
            intake.take(files);
          }}
        />
      ))}
      {draft.images.map((imageId, index) => (
        <TakenImage
          key={imageId}
          imageId={imageId}
          withRemoved={index === 0}
          onRemove={() =>
            change(
              'images',
              draft.images.filter((other) => other !== imageId),
            )
          }
        />
      ))}
      <View style={{ padding: gutter.phone, gap: space(3) }}>{wide ? <DropArea onFiles={intake.take}>{choose}</DropArea> : choose}</View>
      <ScannerBand form={form} fromHeader={scannerFromHeader} />
      <View style={{ padding: gutter.phone }}>
        <TextField
          label="title"
          prose
          value={title}
          onChange={(text) => change('title', text)}
          fromHeader={draft.title === null && suggestion.title !== ''}
          error={errors.title?.message}
          note={draft.title === null && suggestion.title !== '' ? 'made of what is known so far; type over it' : undefined}
          placeholder="what came back wrong, in a few words"
          maxLength={160}
        />
      </View>
    </View>
  );
}
