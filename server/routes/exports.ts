import * as contract from '../contract/exports';
import * as recipeFiles from '../contract/recipe-file';
import { serve, type App } from '../serve';
import * as exported from '../services/export-trial';
import { openRecipeFile } from '../services/open-recipe-file';

export function serveExports(app: App): void {
  const { deps } = app;
  const computed = [
    [contract.readTrialDicom, 'derived.dcm'],
    [contract.readTrialImage, 'image.png'],
    [contract.readTrialImage16, 'image16.png'],
    [contract.readTrialKspace, 'kspace.png'],
    [contract.readTrialKspace16, 'kspace16.png'],
    [contract.readTrialImageArray, 'image.npy'],
    [contract.readTrialKspaceArray, 'kspace.npy'],
  ] as const;
  for (const [route, file] of computed) {
    serve(app, route, ({ caller, params, gone }) => exported.readTrialFile(deps, caller, params, file, gone));
  }
  serve(app, contract.readTrialRecipe, async ({ caller, params, response }) => {
    const { file, name } = await exported.readTrialRecipe(deps, caller, params);
    response.set(exported.asFile(name));
    return file;
  });
  serve(app, contract.readDerivedImage, ({ caller, params, query, gone }) =>
    exported.readDerivedImage(deps, caller, { ...params, ...query }, gone),
  );
  serve(app, recipeFiles.openRecipeFile, ({ caller, body }) => openRecipeFile(deps.db, caller, body));
}
