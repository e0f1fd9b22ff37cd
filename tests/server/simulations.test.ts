/** Simulation over HTTP: what is refused and where, and that the numbers are those of the model. */
import { asComplex, centredGrid } from '../../recon/grid';
import { simulate } from '../../recon/simulate';
import { metricsHeader, type Metrics } from '../../server/contract/planes';
import type { Image } from '../../server/contract/images';
import { openApplication, type Application } from './application';
import { discFile, headFile, motionRecipe, uploadOne } from './files';
import { binary, complexOf, planesOf, realOf } from './planes';

let application: Application;
let disc: Image;
let silent: Image;
beforeAll(async () => {
  application = await openApplication();
  disc = await uploadOne(application, discFile());
  silent = await uploadOne(application, discFile({ without: ['0018,1312'] }));
});
afterAll(() => application.close());

async function run(body: object) {
  const agent = await application.as('technologist');
  const answer = await agent.post('/api/simulations').send(body).buffer().parse(binary);
  return { answer, problem: answer.status === 200 ? undefined : JSON.parse(String(answer.body)) };
}

async function planesAndMetrics(body: object) {
  const { answer } = await run(body);
  expect(answer.status).toBe(200);
  return { planes: planesOf(answer), metrics: JSON.parse(String(answer.get(metricsHeader))) as Metrics };
}

const still = { steps: [], reconstruction: { method: 'zero-filled', parameters: {} }, seed: 1 };

describe('a recipe that cannot be run', () => {
  it('is refused at the parameter that is out of range, and at every other fault', async () => {
    const steps = [
      { cause: 'periodic-motion', parameters: { frequency: 99, phaseSwing: 0.5, start: 0 } },
      { cause: 'gremlins', parameters: {} },
    ];
    const { answer, problem } = await run({ imageId: disc.id, outputs: ['image'], recipe: { ...still, steps } });
    expect([answer.status, problem.code]).toEqual([400, 'invalid-input']);
    expect(problem.issues.map(({ path }: { path: unknown }) => path)).toEqual([
      ['recipe', 'steps', 0, 'parameters', 'frequency'],
      ['recipe', 'steps', 1, 'cause'],
    ]);
    expect(problem.issues[0].message).toContain('99');
  });

  it('is refused at the phase-encode axis when nobody has said which it is: it is never guessed', async () => {
    const { answer, problem } = await run({ imageId: silent.id, outputs: ['image'], recipe: still });
    expect(answer.status).toBe(400);
    expect(problem.issues[0].path).toEqual(['facts', 'phaseEncode']);
    await planesAndMetrics({ imageId: silent.id, outputs: ['image'], recipe: still, facts: { phaseEncode: 'row' } });
  });

  it('is refused where the form of the request is wrong', async () => {
    const { problem } = await run({ imageId: disc.id, outputs: ['hologram'], recipe: { ...still, seed: -1 } });
    expect(problem.issues.map(({ path }: { path: unknown[] }) => path.join('.')).sort()).toEqual(['outputs.0', 'recipe.seed']);
  });

  it('is not found with an image that is not there', async () => {
    const { answer, problem } = await run({ imageId: '1c0a4cb1-62f2-4b0e-8d5f-8a6f6b0f1111', outputs: ['image'], recipe: still });
    expect([answer.status, problem.issues[0].path]).toEqual([404, ['imageId']]);
  });
});

describe('the planes', () => {
  it('come in the order that was asked for, and are those of the model', async () => {
    const recipe = { ...motionRecipe(), objectPhase: { range: 1.6, seed: 5 } };
    const { planes } = await planesAndMetrics({ imageId: disc.id, outputs: ['kspace', 'image', 'kspaceOfImage'], recipe });
    expect(planes.map(({ header }) => header.name)).toEqual(['kspace', 'image', 'kspaceOfImage']);
    const agent = await application.as('technologist');
    const stored = planesOf(await agent.get(`/api/images/${disc.id}/pixels`).buffer().parse(binary).expect(200))[0];
    const object = asComplex({ ...centredGrid(32, 32, [0.002, 0.002]), values: realOf(stored) });
    const model = simulate(object, recipe, { phaseEncode: 'column', repetitionTime: 0.5, averages: 1 });
    // The same computation, rounded once to float32 on the wire.
    expect(realOf(planes[1])).toEqual(Float64Array.from(Float32Array.from(model.image.values)));
    expect(complexOf(planes[0]).im).toEqual(Float64Array.from(Float32Array.from(model.kspace.im)));
    expect(complexOf(planes[2]).re).toEqual(Float64Array.from(Float32Array.from(model.kspaceOfImage().re)));
  });

  it('of a smaller field of view have fewer lines and the same pixel size', async () => {
    const steps = [{ cause: 'field-of-view-reduction', parameters: { fraction: 0.7, offCentre: 0 } }];
    const { planes } = await planesAndMetrics({ imageId: disc.id, outputs: ['image'], recipe: { ...still, steps } });
    // round(0.7 · 32) lines along the phase encoding, which is along the columns here.
    expect(planes[0]?.header).toMatchObject({ rows: 22, columns: 32, spacing: [2, 2], origin: [-22, -32] });
  });
});

describe('the numbers', () => {
  it('are null where nothing is compared, but for the ghost of the simulated image itself', async () => {
    const head = await uploadOne(application, headFile());
    const { metrics } = await planesAndMetrics({ imageId: head.id, outputs: ['image'], recipe: motionRecipe(1.5) });
    expect(metrics).toMatchObject({ nrmse: null, gain: null, ssim: null, ghostRatioOfBad: null });
    expect(metrics.ghostRatio).toBeGreaterThan(0.05);
  });

  it('are those of a perfect match when an image is compared with itself', async () => {
    const compareWith = { imageId: disc.id, frame: 0 };
    const { metrics } = await planesAndMetrics({ imageId: disc.id, outputs: ['image'], recipe: still, compareWith });
    // Two transforms in float64 of values near 600: about 1e-15 of them.
    expect(metrics.nrmse).toBeLessThan(1e-12);
    expect(metrics.gain).toBeCloseTo(1, 12);
    expect(metrics.ssim).toBeCloseTo(1, 12);
  });

  it('compare images of different matrices in millimetres', async () => {
    const fine = await uploadOne(application, discFile({ rows: 64, columns: 64, attributes: { pixelSpacing: [1, 1] } }));
    const shrunk = await uploadOne(application, discFile({ rows: 64, columns: 64, attributes: { pixelSpacing: [0.5, 0.5] } }));
    const against = async (imageId: string) =>
      (await planesAndMetrics({ imageId: disc.id, outputs: ['image'], recipe: still, compareWith: { imageId } })).metrics.nrmse ?? NaN;
    // The same disc in pixels half the size: only its rim, sampled more finely, differs. Half the size of the disc differs all over.
    expect(await against(fine.id)).toBeLessThan(0.25);
    expect(await against(shrunk.id)).toBeGreaterThan(0.5);
  });

  it('are not computed between two planes of space', async () => {
    const sagittal = await uploadOne(application, discFile({ attributes: { imageOrientation: [0, 1, 0, 0, 0, -1] } }));
    const { answer, problem } = await run({ imageId: disc.id, outputs: ['image'], recipe: still, compareWith: { imageId: sagittal.id } });
    expect([answer.status, problem.code, problem.issues[0].path]).toEqual([422, 'not-computable', ['compareWith', 'imageId']]);
  });
});
