/** The images of a case, and the way to add one. */
import { View } from 'react-native';
import { EmptyState } from '@/components/ui/empty-state';
import type { Case } from '@/server/contract/cases';
import { AddImage } from './add-image';
import { ImagesMat } from './images-mat';
import { Section } from './section';

interface ImagesSectionProps {
  found: Case;
  /** The mat runs to the edges of the column: how far they are. */
  bleed: { left: number; right: number };
}

export function ImagesSection({ found, bleed }: ImagesSectionProps) {
  return (
    <Section title="Images">
      {found.images.length > 0 ? (
        <View style={{ marginLeft: -bleed.left, marginRight: -bleed.right }}>
          <ImagesMat images={found.images} found={found} gutters={bleed.left} />
        </View>
      ) : (
        <EmptyState text="No image yet. It may come later, and from somebody else." />
      )}
      {found.may.edit ? <AddImage caseId={found.id} onCase={found.images.map(({ imageId }) => imageId)} /> : null}
    </Section>
  );
}
