/** Files of a trial, and a recipe file that is opened. A file is fetched first, so that a refusal is told and not saved. */
import { useMutation } from '@tanstack/react-query';
import * as exported from '@/server/contract/exports';
import type { TrialFile } from '@/server/contract/exports';
import { openRecipeFile } from '@/server/contract/recipe-file';
import type { Route } from '@/server/contract/route';
import { ApiProblem } from './api-problem';
import { call, send, type CallInput } from './call';

const routes: Record<TrialFile, Route> = {
  'derived.dcm': exported.readTrialDicom,
  'image.png': exported.readTrialImage,
  'image16.png': exported.readTrialImage16,
  'kspace.png': exported.readTrialKspace,
  'kspace16.png': exported.readTrialKspace16,
  'image.npy': exported.readTrialImageArray,
  'kspace.npy': exported.readTrialKspaceArray,
  'recipe.json': exported.readTrialRecipe,
};

/** Saves a file of a trial where the browser saves files, under the name that the server gives it. */
export function useSaveTrialFile(caseId: string) {
  return useMutation({
    mutationFn: async ({ trialId, file }: { trialId: string; file: TrialFile }) => {
      const answer = await send(routes[file], { params: { caseId, trialId } }, { accept: '*/*' });
      const name = /filename="([^"]+)"/.exec(answer.headers.get('Content-Disposition') ?? '')?.[1] ?? `simulated-${file}`;
      keepFile(await answer.blob(), name);
    },
  });
}

function keepFile(bytes: Blob, name: string): void {
  const address = URL.createObjectURL(bytes);
  const link = document.createElement('a');
  link.href = address;
  link.download = name;
  link.click();
  // The browser has taken hold of the bytes by the next turn.
  setTimeout(() => URL.revokeObjectURL(address));
}

type RecipeFileBody = CallInput<typeof openRecipeFile>['body'];

/** Has the server check a recipe file; its faults come with their places. */
export function useOpenRecipeFile() {
  return useMutation({
    mutationFn: async ({ file, imageId }: { file: File; imageId: string }) =>
      call(openRecipeFile, { body: { file: parsedJson(await file.text()) as RecipeFileBody['file'], imageId } }),
  });
}

/** What the file says is checked by the server; here only whether it is JSON at all. */
function parsedJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch (error) {
    if (error instanceof SyntaxError) throw new ApiProblem('invalid-input', 400, 'This file is no JSON: it is not a recipe file.');
    throw error;
  }
}
