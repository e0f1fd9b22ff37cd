/** One series of the inbox: its pictures, and what can be done with all of them, or with those that are chosen. */
import { useRouter } from 'expo-router';
import { useState } from 'react';
import { View } from 'react-native';
import { useCreateCase } from '@/components/api/cases';
import { thumbnailOf } from '@/components/api/images';
import { useDiscardImages, useRefreshInbox } from '@/components/api/push';
import { Button } from '@/components/ui/button';
import { LinkText } from '@/components/ui/link-text';
import { Notice } from '@/components/ui/notice';
import { Picture } from '@/components/ui/picture';
import { Press } from '@/components/ui/press';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { InboxImage } from '@/server/contract/push';
import { caseTitle, seriesWords } from './inbox-words';

/** One line of pictures on a wide page, three on a phone; the rest is fetched when it is asked for. */
const shownAtFirst = 12;

interface SeriesProps {
  scanner: { id: string; name: string };
  images: readonly InboxImage[];
}

export function InboxSeries({ scanner, images }: SeriesProps) {
  const { colours } = useTheme();
  const [chosen, setChosen] = useState<ReadonlySet<string>>(new Set());
  const [all, setAll] = useState(false);
  const shown = all ? images : images.slice(0, shownAtFirst);
  const toggle = (id: string): void => {
    const next = new Set(chosen);
    if (!next.delete(id)) next.add(id);
    setChosen(next);
  };
  const meant = chosen.size > 0 ? images.filter(({ id }) => chosen.has(id)) : images;
  return (
    <View
      role="group"
      aria-label={seriesWords(images)}
      style={{ borderBottomWidth: 1, borderBottomColor: colours.rule, paddingVertical: space(3), gap: space(2) }}
    >
      <Text variant="mono">{seriesWords(images)}</Text>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space(2), alignItems: 'center' }}>
        {shown.map((image, i) => (
          <ImageToChoose key={image.id} image={image} number={i + 1} chosen={chosen.has(image.id)} onPress={() => toggle(image.id)} />
        ))}
        {shown.length < images.length ? <LinkText label={`all ${images.length}`} onPress={() => setAll(true)} /> : null}
      </View>
      <SeriesActions scanner={scanner} meant={meant} some={chosen.size > 0} />
    </View>
  );
}

interface ImageProps {
  image: InboxImage;
  number: number;
  chosen: boolean;
  onPress: () => void;
}

function ImageToChoose({ image, number, chosen, onPress }: ImageProps) {
  const { colours } = useTheme();
  const at = image.timeOfDay === null ? '' : `, ${image.timeOfDay.slice(0, 5)}`;
  return (
    <Press
      role="checkbox"
      aria-checked={chosen}
      aria-label={`image ${number}${at}`}
      pressOnSpace
      onPress={onPress}
      style={() => ({ borderWidth: 2, borderColor: chosen ? colours.weldThread : 'transparent' })}
    >
      <Picture source={thumbnailOf(image.id)} alt="" size={64} />
    </Press>
  );
}

function SeriesActions({ scanner, meant, some }: { scanner: SeriesProps['scanner']; meant: readonly InboxImage[]; some: boolean }) {
  const router = useRouter();
  const create = useCreateCase();
  const discard = useDiscardImages(scanner.id);
  const refresh = useRefreshInbox(scanner.id);
  const [asked, setAsked] = useState(false);
  const ids = meant.map(({ id }) => id);
  const newest = meant.at(-1)?.receivedAt;
  const makeCase = (): void => {
    if (newest === undefined) return;
    const bad = ids.map((imageId) => ({ imageId, role: 'bad' as const }));
    create.mutate(
      { title: caseTitle(scanner.name, newest), scannerId: scanner.id, images: bad },
      {
        onSuccess: (filed) => {
          void refresh();
          router.push({ pathname: '/cases/[caseId]', params: { caseId: filed.id } });
        },
      },
    );
  };
  const error = create.error ?? discard.error;
  const of = some ? ` of ${meant.length}` : '';
  return (
    <>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space(2) }}>
        <Button label={`make a case${of}`} glyph="plus" onPress={makeCase} busy={create.isPending} />
        {asked ? (
          <>
            <Button label={`delete ${meant.length} for good`} onPress={() => discard.mutate(ids)} busy={discard.isPending} />
            <Button label="keep" kind="plain" onPress={() => setAsked(false)} />
          </>
        ) : (
          <Button label={`discard${of}`} kind="plain" onPress={() => setAsked(true)} />
        )}
      </View>
      {error ? <Notice kind="failed" text={error.message} /> : null}
    </>
  );
}
