/** Filing a case in three steps, images first. It can be saved from the first step on and finished later. */
import { useRouter } from 'expo-router';
import { useState } from 'react';
import { View } from 'react-native';
import { ApiProblem } from '@/components/api/api-problem';
import { useCreateCase } from '@/components/api/cases';
import { useImage } from '@/components/api/images';
import { useScanners } from '@/components/api/registry';
import { ActionBar } from '@/components/ui/action-bar';
import { BarHead } from '@/components/ui/bar-head';
import { Button } from '@/components/ui/button';
import { LinkText } from '@/components/ui/link-text';
import { Notice } from '@/components/ui/notice';
import { Screen } from '@/components/ui/screen';
import { Text } from '@/components/ui/text';
import { gutter, space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import { useLayout } from '@/components/ui/use-layout';
import type { Image } from '@/server/contract/images';
import { DraftAside } from './draft-aside';
import { emptyDraft, newCaseFrom, type Draft } from './draft';
import { ImageStep } from './image-step';
import { SeeStep } from './see-step';
import { StepTabs, steps, type Step } from './step-tabs';
import { coilOf, scannerOf, suggest } from './suggest';
import { TriedStep } from './tried-step';
import { useDraft, type DraftForm } from './use-draft';
import { useIntake } from '../intake/use-intake';

interface NewCaseScreenProps {
  memberId: string;
  /** Named in the address: the code on the console leads here. */
  scannerId: string | null;
}

const clock = (at: number): string => {
  const time = new Date(at);
  return `${String(time.getHours()).padStart(2, '0')}:${String(time.getMinutes()).padStart(2, '0')}`;
};

const isField = (name: unknown): name is keyof Draft => typeof name === 'string' && name in emptyDraft;

/** Marks the fields that the server refused; says whether there was one on the page. */
function markFields(error: Error, form: DraftForm): void {
  if (!(error instanceof ApiProblem)) return;
  for (const { path, message } of error.issues) {
    const field = path.find(isField);
    if (field) form.setError(field, { message });
  }
}

export function NewCaseScreen({ memberId, scannerId }: NewCaseScreenProps) {
  const router = useRouter();
  const form = useDraft(memberId, { scannerId });
  const { draft } = form;
  const { colours } = useTheme();
  const [step, setStep] = useState<Step>('images');
  const scanners = useScanners();
  const firstImage = useImage(draft.images[0] ?? null);
  const facts = firstImage.data?.acquisition;
  const scanner = scanners.data?.find(({ id }) => id === draft.scannerId);
  const suggestion = suggest(draft, facts, scanner?.name);
  const named = facts && scanners.data ? scannerOf(facts, scanners.data) : undefined;
  const intake = useIntake(
    (images: Image[]) => {
      const before = form.current();
      form.change('images', [...before.images, ...images.map(({ id }) => id)]);
      const [first] = images;
      const fitting = first && before.scannerId === null ? scannerOf(first.acquisition, scanners.data ?? []) : undefined;
      if (!first || !fitting) return;
      form.change('scannerId', fitting.id);
      form.change('coilId', coilOf(first.acquisition, fitting));
    },
    () => form.current().images,
  );
  const create = useCreateCase();
  const save = (): void => {
    const body = newCaseFrom(draft, suggestion);
    if (body.title === '') {
      setStep('images');
      form.setError('title', { message: 'Say in a few words what came back wrong.' });
      return;
    }
    create.mutate(body, {
      onSuccess: ({ id }) => {
        form.forget();
        router.replace({ pathname: '/cases/new', params: { saved: id } });
      },
      onError: (error) => markFields(error, form),
    });
  };
  const next = steps[steps.indexOf(step) + 1];
  const count = draft.images.length;
  const onward = step === 'images' ? (count === 0 ? 'no image yet' : `go on with ${count} ${count === 1 ? 'image' : 'images'}`) : 'go on';
  const busy = create.isPending;
  const wide = useLayout() === 'wide';
  return (
    <Screen
      title="New case"
      head={
        <>
          <BarHead
            back="/cases"
            backLabel="leave; the draft is kept"
            backGlyph="shut"
            title="New case"
            level={1}
            end={
              <Text variant="small" tone="inkFaint" style={{ paddingRight: space(3) }}>
                {form.keptAt === null ? '' : `draft kept ${clock(form.keptAt)}`}
              </Text>
            }
          />
          <StepTabs step={step} onChange={setStep} even={!wide} />
        </>
      }
      actions={
        <ActionBar>
          {next ? <Button label="save as it is" busy={busy} disabled={intake.progress !== null} onPress={save} /> : null}
          {next ? (
            <Button label={onward} kind="first" grow={!wide} onPress={() => setStep(next)} />
          ) : (
            <Button label="file the case" kind="first" grow={!wide} busy={busy} onPress={save} />
          )}
        </ActionBar>
      }
    >
      <View style={wide ? { flexGrow: 1, flexDirection: 'row' } : null}>
        <View style={wide ? { width: 720, borderRightWidth: 1, borderRightColor: colours.rule } : null}>
          {form.restored && form.keptAt !== null && step === 'images' ? (
            <View style={{ padding: gutter.phone }}>
              <Notice kind="waiting" text="An unfinished draft is back." action={<LinkText label="start anew" onPress={form.forget} />} />
            </View>
          ) : null}
          {create.error ? (
            <View style={{ padding: gutter.phone }}>
              <Notice kind="failed" text={create.error.message} />
            </View>
          ) : null}
          {step === 'images' ? (
            <ImageStep
              form={form}
              intake={intake}
              suggestion={suggestion}
              scannerFromHeader={named !== undefined && named.id === draft.scannerId}
            />
          ) : null}
          {step === 'see' ? <SeeStep form={form} /> : null}
          {step === 'tried' ? <TriedStep form={form} suggestion={suggestion} /> : null}
        </View>
        {wide ? <DraftAside draft={draft} suggestion={suggestion} scanner={scanner} /> : null}
      </View>
    </Screen>
  );
}
