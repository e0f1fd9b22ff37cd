/** Step 1: the scanner and the images. The header fills in what it can; files that were refused say why. */
import { View } from 'react-native';
import { Notice } from '@/components/ui/notice';
import { Text } from '@/components/ui/text';
import { TextField } from '@/components/ui/text-field';
import { gutter, space } from '@/components/ui/theme';
import { useLayout } from '@/components/ui/use-layout';
import { DraftImages } from '../intake/draft-images';
import { IntakeProgress } from '../intake/intake-progress';
import { Refusals } from '../intake/refusals';
import type { Intake } from '../intake/use-intake';
import type { Suggestion } from './draft';
import { DropArea } from './drop-area';
import { FileButton } from './file-button';
import { ScannerBand } from './scanner-band';
import type { DraftForm } from './use-draft';

interface ImageStepProps {
  form: DraftForm;
  intake: Intake;
  suggestion: Suggestion;
  scannerFromHeader: boolean;
}

export function ImageStep({ form, intake, suggestion, scannerFromHeader }: ImageStepProps) {
  const wide = useLayout() === 'wide';
  const { draft, change, errors } = form;
  const title = draft.title ?? suggestion.title;
  const busy = intake.progress ? intake.progress.settled / intake.progress.count : false;
  const choose = (
    <>
      <View style={{ flexDirection: 'row', gap: space(2) }}>
        <FileButton label={draft.images.length > 0 ? 'add files' : 'choose files'} grow busy={busy} onFiles={intake.take} />
        <FileButton label="choose a folder" folder grow busy={busy} onFiles={intake.take} />
      </View>
      <IntakeProgress intake={intake} />
      {intake.failure ? <Notice kind="failed" text={intake.failure.message} /> : null}
      <Text variant="detail" tone="inkSoft">
        {wide ? 'Or drop DICOM files, a folder or a zip here. ' : 'A zip is opened. '}Names, numbers and dates are taken out while an image
        is read. A photograph of the screen is refused: it shows names.
      </Text>
    </>
  );
  return (
    <View>
      <Refusals intake={intake} />
      <DraftImages images={draft.images} onChange={(images) => change('images', images)} />
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
