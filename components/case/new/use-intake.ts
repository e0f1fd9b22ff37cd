/** Taking files in: sends them in small lots, one after the other, and gathers what was taken and what was refused. */
import { useState } from 'react';
import { useUpload } from '@/components/api/images';
import type { Image, Refusal } from '@/server/contract/images';

/** Files in one request: a series arrives in lots, so that one bad lot does not lose the rest. */
const lotSize = 8;

export interface IntakeProgress {
  readonly done: number;
  readonly sentence: string;
}

export function useIntake(onTaken: (images: Image[]) => void) {
  const upload = useUpload();
  const [progress, setProgress] = useState<IntakeProgress | null>(null);
  const [refused, setRefused] = useState<Refusal[]>([]);
  const [failure, setFailure] = useState<Error | null>(null);
  const report = (sent: number, part: number, count: number): void =>
    setProgress({
      done: (sent + part) / count,
      sentence: count === 1 ? 'taking the image in' : `taking in ${Math.min(count, sent + 1)} of ${count}`,
    });
  const take = async (files: readonly File[]): Promise<void> => {
    setFailure(null);
    try {
      for (let sent = 0; sent < files.length; sent += lotSize) {
        const lot = files.slice(sent, sent + lotSize);
        report(sent, 0, files.length);
        const result = await upload.mutateAsync({ files: lot, onProgress: (done) => report(sent, done * lot.length, files.length) });
        if (result.images.length > 0) onTaken(result.images);
        setRefused((before) => [...before, ...result.refused]);
      }
    } catch (error) {
      setFailure(error instanceof Error ? error : new Error('The upload failed.'));
    } finally {
      setProgress(null);
    }
  };
  return {
    take: (files: readonly File[]): void => void take(files),
    progress,
    refused,
    failure,
    leaveOut: (refusal: Refusal): void => setRefused((before) => before.filter((other) => other !== refusal)),
  };
}
