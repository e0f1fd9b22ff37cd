/** Files on the bench: the kept trial is saved, a recipe file is opened. What is wrong with a recipe file is listed with its place. */
import { useRef, useState } from 'react';
import { ApiProblem } from '@/components/api/api-problem';
import { useOpenRecipeFile, useSaveTrialFile } from '@/components/api/trial-files';
import { trialFileRows } from '@/components/case/view/trial-file-rows';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { GlyphMenu } from '@/components/ui/glyph-menu';
import { Text } from '@/components/ui/text';
import { useBench } from './bench-context';
import { issueLines } from './recipe-file-issues';
import type { Keep } from './use-keep-as-trial';

const openRow = 'open';

export function BenchFiles({ keep }: { keep: Keep }) {
  const { kase, source, dispatch } = useBench();
  const input = useRef<HTMLInputElement>(null);
  const [name, setName] = useState('');
  const save = useSaveTrialFile(kase.id);
  const open = useOpenRecipeFile();
  const trial = keep.kept;
  const rows = [
    { id: openRow, label: 'open a recipe file', aside: 'JSON' },
    ...trialFileRows.map((row) => ({ ...row, label: `save ${row.label}`, ...(trial ? {} : { disabled: true, aside: 'keep it first' }) })),
  ] as const;
  const take = (file: File | undefined): void => {
    if (file === undefined) return;
    setName(file.name);
    open.mutate({ file, imageId: source.id }, { onSuccess: ({ recipe }) => dispatch({ kind: 'replace', recipe }) });
  };
  const error = open.error ?? save.error;
  const close = (): void => {
    open.reset();
    save.reset();
  };
  return (
    <>
      <input
        ref={input}
        type="file"
        accept="application/json,.json"
        hidden
        aria-label="open a recipe file"
        onChange={(event) => {
          const file = event.currentTarget.files?.[0];
          take(file);
          // The same file may be chosen again after it was refused.
          event.currentTarget.value = '';
        }}
      />
      <GlyphMenu
        glyph="save"
        label="files"
        rows={rows}
        onChoose={(id) => {
          if (id === openRow) input.current?.click();
          else if (trial) save.mutate({ trialId: trial.id, file: id });
        }}
      />
      {error ? (
        <Dialog
          title={open.error ? `${name} was not opened` : 'Not saved'}
          text={error.message}
          onClose={close}
          actions={<Button label="close" kind="first" grow onPress={close} />}
        >
          {(error instanceof ApiProblem ? issueLines(error.issues) : []).map((line) => (
            <Text key={line} variant="mono">
              {line}
            </Text>
          ))}
        </Dialog>
      ) : null}
    </>
  );
}
