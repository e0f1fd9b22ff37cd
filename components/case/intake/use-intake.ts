/** Taking files in: what was chosen is laid out file by file, sent, and of what arrived it is proposed which images go on the case. */
import { useQueryClient } from '@tanstack/react-query';
import { useRef, useState } from 'react';
import { fetchImage, imageKey } from '@/components/api/images';
import { fetchSlices } from '@/components/api/series';
import type { Image, Refusal } from '@/server/contract/images';
import { isOfTheSystem } from './dropped-files';
import { fileToSend, type FileToSend } from './file-to-send';
import { canUnpack, isArchive, openArchive } from './open-archive';
import { propose } from './propose';
import { Run } from './run';
import { sendSeries, type Line } from './send-series';

export interface IntakeProgress {
  /** Files that have arrived or were refused, of all. */
  readonly settled: number;
  readonly count: number;
  readonly state: 'sending' | 'paused' | 'waiting';
}

/** Archives become their files, here where the browser can. */
async function laidOut(chosen: readonly File[]): Promise<{ files: FileToSend[]; refused: Refusal[] }> {
  const files: FileToSend[] = [];
  const refused: Refusal[] = [];
  for (const file of chosen.filter((one) => !isOfTheSystem(one))) {
    const opened = canUnpack() && (await isArchive(file)) ? await openArchive(file) : [fileToSend(file)];
    if ('code' in opened) refused.push(opened);
    else files.push(...opened);
  }
  return { files, refused };
}

export function useIntake(onTaken: (images: Image[]) => void, onCase: () => readonly string[]) {
  const client = useQueryClient();
  const run = useRef<Run | null>(null);
  const [progress, setProgress] = useState<IntakeProgress | null>(null);
  const [refused, setRefused] = useState<Refusal[]>([]);
  const [failure, setFailure] = useState<Error | null>(null);
  const setState = (state: IntakeProgress['state']): void => setProgress((before) => before && { ...before, state });

  const sendAll = async (chosen: readonly File[], current: Run): Promise<void> => {
    const { files, refused: unopened } = await laidOut(chosen);
    setRefused((before) => [...before, ...unopened]);
    if (files.length === 0) return;
    const arrived: string[] = [];
    setProgress({ settled: 0, count: files.length, state: 'sending' });
    const line: Line = {
      ...current.line,
      send: async (lot, onProgress) => {
        const result = await current.line.send(lot, onProgress);
        for (const image of result.images) client.setQueryData(imageKey(image.id), image);
        return result;
      },
    };
    await sendSeries(files, line, {
      onProgress: (settled) =>
        setProgress((before) => ({ settled, count: files.length, state: before?.state === 'paused' ? 'paused' : 'sending' })),
      onLost: () => setState('waiting'),
      onArrived: (result) => {
        arrived.push(...result.imageIds);
        setRefused((before) => [...before, ...result.refused]);
      },
    });
    const came = await Promise.all(arrived.map((imageId) => fetchImage(client, imageId)));
    const proposed = await propose(came, onCase(), (imageId) => fetchSlices(client, imageId));
    const images = await Promise.all(proposed.map((imageId) => fetchImage(client, imageId)));
    if (images.length > 0) onTaken(images);
  };

  const take = async (chosen: readonly File[]): Promise<void> => {
    if (run.current !== null) return;
    const current = new Run();
    run.current = current;
    setFailure(null);
    try {
      await sendAll(chosen, current);
    } catch (error) {
      if (!current.isCancelled) setFailure(error instanceof Error ? error : new Error('The upload failed.'));
    } finally {
      run.current = null;
      setProgress(null);
    }
  };

  return {
    take: (chosen: readonly File[]): void => void take(chosen),
    progress,
    refused,
    failure,
    pause: (): void => {
      run.current?.pause();
      setState('paused');
    },
    resume: (): void => {
      run.current?.resume();
      setState('sending');
    },
    cancel: (): void => run.current?.cancel(),
    leaveOut: (refusal: Refusal): void => setRefused((before) => before.filter((other) => other !== refusal)),
    leaveOutAll: (): void => setRefused([]),
  };
}

export type Intake = ReturnType<typeof useIntake>;
