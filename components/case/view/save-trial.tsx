/** Save a trial as …: a menu of what it can be saved as. Why one cannot be saved is told in a dialog. */
import { useSaveTrialFile } from '@/components/api/trial-files';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { GlyphMenu } from '@/components/ui/glyph-menu';
import type { Trial } from '@/server/contract/case-parts';
import { trialFileRows } from './trial-file-rows';

interface SaveTrialProps {
  caseId: string;
  trial: Pick<Trial, 'id' | 'number'>;
}

export function SaveTrial({ caseId, trial }: SaveTrialProps) {
  const save = useSaveTrialFile(caseId);
  return (
    <>
      <GlyphMenu
        glyph="save"
        label={`save trial ${trial.number} as`}
        rows={trialFileRows}
        onChoose={(file) => save.mutate({ trialId: trial.id, file })}
      />
      {save.error ? (
        <Dialog
          title="Not saved"
          text={save.error.message}
          onClose={save.reset}
          actions={<Button label="close" kind="first" grow onPress={save.reset} />}
        />
      ) : null}
    </>
  );
}
