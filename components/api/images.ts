/** Images: what is known of one, its pictures, facts that a member sets, and the upload with its progress. */
import { useMutation, useQuery, useQueryClient, type QueryClient } from '@tanstack/react-query';
import type { CorrectableFacts } from '@/server/contract/facts';
import {
  correctFacts,
  readImage,
  readThumbnail,
  uploadImages,
  uploadResultSchema,
  type Image,
  type UploadResult,
} from '@/server/contract/images';
import { ApiProblem, noAnswer, problemFrom } from './api-problem';
import { addressOf, call } from './call';

export const imageKey = (imageId: string) => ['image', imageId] as const;

/** Address of the small picture of an image, or of its log-magnitude k-space. */
export const thumbnailOf = (imageId: string, domain: 'image' | 'kspace' = 'image'): string =>
  addressOf(readThumbnail.path, { imageId }, domain === 'image' ? {} : { domain });

export const useImage = (imageId: string | null) =>
  useQuery({
    queryKey: imageKey(imageId ?? ''),
    queryFn: ({ signal }) => call(readImage, { params: { imageId: imageId ?? '' } }, signal),
    enabled: imageId !== null,
    staleTime: 300_000,
  });

export function useCorrectFacts(imageId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (facts: CorrectableFacts) => call(correctFacts, { params: { imageId }, body: facts }),
    onSuccess: (image) => client.setQueryData(imageKey(imageId), image),
  });
}

const parse = (text: string): unknown => {
  try {
    return JSON.parse(text);
  } catch {
    // Not JSON: the caller reports an answer that was not understood.
    return null;
  }
};

/** An answer to an upload: 201 and 422 carry the same body, what was taken and what was refused. */
export function readUploadAnswer(status: number, text: string): UploadResult {
  const body = parse(text);
  const result = uploadResultSchema.safeParse(body);
  if (result.success && (status === 201 || status === 422)) return result.data;
  if (status >= 400) throw problemFrom(status, body);
  throw new ApiProblem('not-understood', status, 'The answer of the server was not understood: reload the page.');
}

/** Sends files in one request. XMLHttpRequest, because fetch does not report how much has been sent. */
export function upload(files: readonly File[], onProgress: (done: number) => void, signal?: AbortSignal): Promise<UploadResult> {
  const form = new FormData();
  for (const file of files) form.append('files', file, file.name);
  return new Promise((resolve, reject) => {
    const request = new XMLHttpRequest();
    request.open('POST', uploadImages.path);
    request.setRequestHeader('accept', 'application/json');
    request.upload.onprogress = (event) => onProgress(event.total > 0 ? event.loaded / event.total : 0);
    request.onerror = () => reject(noAnswer());
    request.onabort = () => reject(new DOMException('The upload was cancelled.', 'AbortError'));
    request.onload = () => {
      try {
        resolve(readUploadAnswer(request.status, request.responseText));
      } catch (error) {
        reject(error instanceof Error ? error : noAnswer());
      }
    };
    signal?.addEventListener('abort', () => request.abort(), { once: true });
    request.send(form);
  });
}

/** An image as it is kept for the screens that show it, fetched where it is not. */
export const fetchImage = (client: QueryClient, imageId: string): Promise<Image> =>
  client.fetchQuery({
    queryKey: imageKey(imageId),
    queryFn: ({ signal }) => call(readImage, { params: { imageId } }, signal),
    staleTime: 300_000,
  });
