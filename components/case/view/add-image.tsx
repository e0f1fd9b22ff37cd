/** Images that come later, from whoever has them: the role is chosen first, then the file. */
import { useState } from 'react';
import { View } from 'react-native';
import { useAttachImage } from '@/components/api/cases';
import { Notice } from '@/components/ui/notice';
import { Select } from '@/components/ui/select';
import { space } from '@/components/ui/theme';
import { imageRoles } from '@/server/contract/cases';
import { FileButton } from '../new/file-button';
import { IntakeProgress } from '../intake/intake-progress';
import { Refusals } from '../intake/refusals';
import { useIntake } from '../intake/use-intake';
import { imageRoleWords } from '../words';

type ImageRole = (typeof imageRoles)[number];

export function AddImage({ caseId, onCase }: { caseId: string; onCase: readonly string[] }) {
  const [role, setRole] = useState<ImageRole>('comparison');
  const attach = useAttachImage(caseId);
  const intake = useIntake(
    (images) => {
      for (const image of images) attach.mutate({ imageId: image.id, role });
    },
    () => onCase,
  );
  const failure = attach.error ?? intake.failure;
  return (
    <View style={{ gap: space(3), paddingTop: space(3) }}>
      <View style={{ flexDirection: 'row', alignItems: 'flex-end', gap: space(2) }}>
        <View style={{ flex: 1, maxWidth: 240 }}>
          <Select
            label="another image, as"
            value={role}
            rows={imageRoles.map((id) => ({ id, label: imageRoleWords[id].word }))}
            onChange={(id) => setRole(imageRoles.find((other) => other === id) ?? 'comparison')}
          />
        </View>
        <FileButton
          label="choose files"
          tall
          busy={intake.progress ? intake.progress.settled / intake.progress.count : false}
          onFiles={intake.take}
        />
      </View>
      <IntakeProgress intake={intake} />
      {failure ? <Notice kind="failed" text={failure.message} /> : null}
      <Refusals intake={intake} />
    </View>
  );
}
