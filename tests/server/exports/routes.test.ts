/** Files of a trial over HTTP: what comes, under which name, and that it is the trial that was kept. */
import { createHash } from 'node:crypto';
import dicomParser from 'dicom-parser';
import { eq } from 'drizzle-orm';
import { trials } from '../../../db/schema/case-parts';
import { recipeFileSchema } from '../../../server/contract/recipe-file';
import { trialFiles } from '../../../server/contract/exports';
import { openApplication, type Application } from '../application';
import { discFile, headFile, motionRecipe } from '../files';
import { binary } from '../planes';
import { fileOf, keepTrialOf, type Kept } from './trial';

let application: Application;
let kept: Kept;
beforeAll(async () => {
  application = await openApplication();
  kept = await keepTrialOf(application, headFile());
});
afterAll(() => application.close());

const uidsOf = (bytes: Buffer): string[] => {
  const dataSet = dicomParser.parseDicom(bytes);
  return ['x00080018', 'x0020000d', 'x0020000e', 'x00200052'].map((tag) => dataSet.string(tag) ?? '');
};

describe('the files of a trial', () => {
  it.each(trialFiles)('%s comes under a name with the number of the case and the word simulated', async (file) => {
    const answer = await fileOf(application, kept, file);
    expect(answer.status).toBe(200);
    expect(answer.get('Content-Disposition')).toBe(`attachment; filename="case-${kept.caseNumber}-trial-1-simulated-${file}"`);
  });

  it('image.npy holds the very plane whose digest was kept', async () => {
    const { body } = await fileOf(application, kept, 'image.npy');
    expect(
      createHash('sha256')
        .update(body.subarray(-256 * 256 * 4))
        .digest('hex'),
    ).toBe(kept.trial.digest);
  });

  it('derived.dcm has identifiers of its own, the same each time, and the study of its case', async () => {
    const [first, again] = [await fileOf(application, kept, 'derived.dcm'), await fileOf(application, kept, 'derived.dcm')];
    expect(again.body.equals(first.body)).toBe(true);
    const uids = uidsOf(first.body);
    const original = uidsOf(headFile());
    expect(uids.every((uid) => /^2\.25\.\d{1,39}$/.test(uid))).toBe(true);
    expect(new Set([...uids, ...original]).size).toBe(8);
    const agent = await application.as('technologist');
    const second = await agent
      .post(`/api/cases/${kept.caseId}/trials`)
      .send({ imageId: kept.image.id, recipe: motionRecipe(1) })
      .expect(201);
    const [image, study, series] = uidsOf((await fileOf(application, { ...kept, trial: second.body }, 'derived.dcm')).body);
    expect([image === uids[0], study === uids[1], series === uids[2]]).toEqual([false, true, false]);
  });

  it('stay what they were when a scan fact of the image is corrected afterwards', async () => {
    const disc = await keepTrialOf(application, discFile());
    const before = await fileOf(application, disc, 'image.npy');
    const agent = await application.as('physicist');
    // Another TR would move the ghost of the recipe.
    await agent.patch(`/api/images/${disc.image.id}/facts`).send({ repetitionTimeMs: 640 }).expect(200);
    const after = await fileOf(application, disc, 'image.npy');
    expect(after.status).toBe(200);
    expect(after.body.equals(before.body)).toBe(true);
  });

  it('are not handed out when the model no longer gives the pixels that were kept', async () => {
    const disc = await keepTrialOf(application, discFile());
    await application.deps.db
      .update(trials)
      .set({ digest: '0'.repeat(64) })
      .where(eq(trials.id, disc.trial.id));
    const answer = await fileOf(application, disc, 'image.png');
    expect([answer.status, JSON.parse(String(answer.body)).code]).toEqual([422, 'not-computable']);
  });

  it('are not found from another department', async () => {
    const agent = await application.as('technologist', 'other');
    for (const file of trialFiles) await agent.get(`/api/cases/${kept.caseId}/trials/${kept.trial.id}/${file}`).expect(404);
  });
});

describe('a recipe file', () => {
  const open = async (body: object) => (await application.as('technologist')).post('/api/recipes').send(body);
  const saved = async () => recipeFileSchema.parse(JSON.parse(String((await fileOf(application, kept, 'recipe.json')).body)));

  it('names the product, the causes, the parameters, the seed and the reconstruction, and nothing of the case', async () => {
    const { body } = await fileOf(application, kept, 'recipe.json');
    const file = await saved();
    expect(file).toMatchObject({ schema: 'pickglass-recipe', version: 1, product: { name: 'Pickglass' }, recipe: motionRecipe() });
    expect(file.inWords).toMatch(/^Periodic motion: .*Seed 1$/);
    for (const word of ['Ghosts over the brain', kept.caseId, kept.image.id, kept.trial.id]) expect(String(body)).not.toContain(word);
  });

  it('opens again as the same recipe', async () => {
    const answer = await open({ file: await saved(), imageId: kept.image.id });
    expect(answer.status).toBe(200);
    expect(answer.body).toEqual({ recipe: kept.trial.recipe, phaseEncode: kept.trial.phaseEncode });
  });

  it('is refused at the place concerned', async () => {
    const file = await saved();
    const [step] = file.recipe.steps;
    const beyond = { ...step, parameters: { ...step?.parameters, frequency: 99 } };
    const cases = [
      [{ ...file, recipe: { ...file.recipe, steps: [beyond] } }, ['file', 'recipe', 'steps', 0, 'parameters', 'frequency']],
      [{ ...file, recipe: { ...file.recipe, seed: -1 } }, ['file', 'recipe', 'seed']],
      [{ ...file, version: 2 }, ['file', 'version']],
      [{ ...file, schema: 'another' }, ['file', 'schema']],
    ] as const;
    for (const [wrong, path] of cases) {
      const answer = await open({ file: wrong });
      expect([answer.status, answer.body.issues[0].path]).toEqual([400, path]);
    }
  });
});

describe('a derived image without a case', () => {
  const derivedOf = async (query: Record<string, string>) =>
    (await application.as('technologist')).get(`/api/images/${kept.image.id}/derived.dcm`).query(query).buffer().parse(binary);

  it('takes a recipe from the query, and none leaves the image as it is', async () => {
    const withRecipe = await derivedOf({ recipe: JSON.stringify(motionRecipe()) });
    const asItIs = await derivedOf({});
    expect([withRecipe.status, asItIs.status]).toEqual([200, 200]);
    const described = (bytes: Buffer) => dicomParser.parseDicom(bytes).string('x00082111');
    expect(described(withRecipe.body)).toContain('Periodic motion');
    expect(described(asItIs.body)).toContain('No cause: the image as it is');
    expect(withRecipe.get('Content-Disposition')).toBe('attachment; filename="simulated-derived.dcm"');
  });

  it.each([
    ['{', ['recipe']],
    ['{"steps":[]}', ['recipe', 'reconstruction']],
    [JSON.stringify({ ...motionRecipe(), seed: 1.5 }), ['recipe', 'seed']],
  ])('refuses the recipe %s at its place', async (recipe, path) => {
    const answer = await derivedOf({ recipe });
    const problem = JSON.parse(String(answer.body));
    expect([answer.status, problem.issues[0].path]).toEqual([400, path]);
  });
});
