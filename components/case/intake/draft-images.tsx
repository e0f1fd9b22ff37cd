/** The images of a draft: those of one series on one card, a single one on a card of its own. */
import { useQueries } from '@tanstack/react-query';
import { slicesQuery } from '@/components/api/series';
import type { Slice } from '@/server/contract/series';
import { TakenImage } from '../new/taken-image';
import { imagesOf } from './propose';
import { SeriesCard } from './series-card';

interface DraftImagesProps {
  images: readonly string[];
  onChange: (images: string[]) => void;
}

interface Group {
  /** Empty until it is known, and where there is one image only. */
  readonly slices: readonly Slice[];
  readonly chosen: readonly string[];
}

/** Images by their series, in the order in which the first of each came. */
export function groupsOf(images: readonly string[], slicesOf: (imageId: string) => readonly Slice[]): Group[] {
  const left = new Set(images);
  return images.flatMap((imageId) => {
    if (!left.has(imageId)) return [];
    const slices = slicesOf(imageId);
    const series = imagesOf(slices);
    const chosen = images.filter((id) => left.has(id) && (id === imageId || series.includes(id)));
    for (const id of chosen) left.delete(id);
    return [{ slices: series.length > 1 ? slices : [], chosen }];
  });
}

export function DraftImages({ images, onChange }: DraftImagesProps) {
  const answers = useQueries({ queries: images.map(slicesQuery) });
  const groups = groupsOf(images, (imageId) => answers[images.indexOf(imageId)]?.data ?? []);
  const replace = (old: readonly string[], chosen: readonly string[]): void =>
    onChange([...images.filter((id) => !old.includes(id)), ...chosen]);
  return groups.map(({ slices, chosen }, index) =>
    slices.length > 0 ? (
      <SeriesCard
        key={imagesOf(slices)[0]}
        slices={slices}
        chosen={chosen}
        withRemoved={index === 0}
        onChange={(next) => replace(chosen, next)}
      />
    ) : (
      chosen.map((imageId) => (
        <TakenImage key={imageId} imageId={imageId} withRemoved={index === 0} onRemove={() => replace([imageId], [])} />
      ))
    ),
  );
}
