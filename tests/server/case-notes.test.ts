/** Trials, marks, comments and findings of a case. */
import { createHash } from 'node:crypto';
import { decode } from 'fast-png';
import type { Image } from '../../server/contract/images';
import { openApplication, type Application } from './application';
import { headFile, motionRecipe, uploadOne } from './files';
import { binary } from './planes';

let application: Application;
let head: Image;
let at: string;
beforeAll(async () => {
  application = await openApplication();
  head = await uploadOne(application, headFile());
  const agent = await application.as('technologist');
  const filed = await agent
    .post('/api/cases')
    .send({ title: 'Ghosts', images: [{ imageId: head.id, role: 'bad' }] })
    .expect(201);
  at = `/api/cases/${filed.body.id}`;
});
afterAll(() => application.close());

describe('a trial', () => {
  const wish = () => ({
    imageId: head.id,
    compareWith: { imageId: head.id },
    recipe: { ...motionRecipe(), objectPhase: { range: 1.6, seed: 2 } },
    note: 'near',
  });

  it('reopened gives the same bytes again: its digest is that of the image plane of its own recipe', async () => {
    const agent = await application.as('physicist');
    const kept = (await agent.post(`${at}/trials`).send(wish()).expect(201)).body;
    const [reopened] = (await agent.get(`${at}/trials`).expect(200)).body;
    expect(reopened).toEqual(kept);
    const body = { imageId: reopened.imageId, recipe: reopened.recipe, outputs: ['image'], facts: { phaseEncode: reopened.phaseEncode } };
    const answer = await agent.post('/api/simulations').send(body).buffer().parse(binary).expect(200);
    expect(createHash('sha256').update(answer.body).digest('hex')).toBe(kept.digest);
    const again = (await agent.post(`${at}/trials`).send(wish()).expect(201)).body;
    expect([again.digest, again.number]).toEqual([kept.digest, kept.number + 1]);
    const other = (await agent.post(`${at}/trials`).send({ ...wish(), recipe: { ...wish().recipe, objectPhase: { range: 1.6, seed: 3 } } }))
      .body;
    expect(other.digest).not.toBe(kept.digest);
  });

  it('is kept with every value filled in, so that a later default cannot change it', async () => {
    const agent = await application.as('technologist');
    const recipe = { ...motionRecipe(), steps: [{ cause: 'periodic-motion', parameters: { frequency: 0.4 } }] };
    const kept = (await agent.post(`${at}/trials`).send({ imageId: head.id, recipe }).expect(201)).body;
    const { body: causes } = await agent.get('/api/causes').expect(200);
    const { parameters } = causes.find(({ id }: { id: string }) => id === 'periodic-motion');
    expect(Object.keys(kept.recipe.steps[0].parameters).sort()).toEqual(parameters.map(({ id }: { id: string }) => id).sort());
    expect(kept.metrics).toMatchObject({ nrmse: null });
    expect(kept.metrics).not.toHaveProperty('computedInMs');
  });

  it('is not kept when its recipe is out of range: no row, no picture', async () => {
    const agent = await application.as('technologist');
    const before = [(await agent.get(`${at}/trials`)).body.length, (await application.objectNames()).length];
    const refused = await agent
      .post(`${at}/trials`)
      .send({ imageId: head.id, recipe: motionRecipe(77) })
      .expect(400);
    expect(refused.body.issues[0].path).toEqual(['recipe', 'steps', 0, 'parameters', 'phaseSwing']);
    expect([(await agent.get(`${at}/trials`)).body.length, (await application.objectNames()).length]).toEqual(before);
  });

  it('has pictures that carry the word SIMULATED in their pixels', async () => {
    const agent = await application.as('technologist');
    const [trial] = (await agent.get(`${at}/trials`).expect(200)).body;
    for (const domain of ['image', 'kspace']) {
      const answer = await agent.get(`${at}/trials/${trial.id}/thumbnail?domain=${domain}`).buffer().parse(binary).expect(200);
      const { width, height, data } = decode(answer.body);
      const strip = Array.from(data.slice((height - 10) * width, (height - 2) * width));
      // Black ground with white letters and nothing between: 135 dots make the nine letters.
      expect(strip.filter((level, i) => level === 255 && i % width > 1 && i % width < width - 2)).toHaveLength(135);
    }
  });
});

describe('a mark', () => {
  it('belongs to pixels of an image, with fractions, and comes back as it was drawn', async () => {
    const agent = await application.as('technologist');
    const drawn = {
      imageId: head.id,
      frame: 0,
      domain: 'kspace',
      kind: 'polyline',
      points: [
        [1.25, 2],
        [130, 128.5],
      ],
      text: 'a line',
    };
    const kept = (await agent.post(`${at}/marks`).send(drawn).expect(201)).body;
    expect(kept).toMatchObject(drawn);
    expect((await agent.get(`${at}/marks`).expect(200)).body).toContainEqual(kept);
  });

  it('is taken away by who drew it, by a lead technologist or by a physicist, and by nobody else', async () => {
    const draw = async () => {
      const agent = await application.as('technologist');
      return (
        await agent
          .post(`${at}/marks`)
          .send({ imageId: head.id, kind: 'arrow', points: [[5, 5]] })
          .expect(201)
      ).body.id as string;
    };
    const foreign = await draw();
    await (await application.as('administrator')).delete(`${at}/marks/${foreign}`).expect(403);
    for (const role of ['technologist', 'lead-technologist', 'physicist'] as const) {
      const agent = await application.as(role);
      const mark = await draw();
      await agent.delete(`${at}/marks/${mark}`).expect(204);
      await agent.delete(`${at}/marks/${mark}`).expect(404);
    }
  });

  it('without a point, on an unknown image or beyond its frames is refused at its field', async () => {
    const agent = await application.as('technologist');
    const good = { imageId: head.id, kind: 'arrow', points: [[1, 1]] };
    const pathOf = async (body: object) => (await agent.post(`${at}/marks`).send(body).expect(400)).body.issues[0].path;
    expect(await pathOf({ ...good, points: [] })).toEqual(['points']);
    expect(await pathOf({ ...good, frame: 3 })).toEqual(['frame']);
    expect(await pathOf({ ...good, imageId: '1c0a4cb1-62f2-4b0e-8d5f-8a6f6b0f1111' })).toEqual(['imageId']);
  });
});

describe('the discussion', () => {
  it('reads from the oldest note to the newest', async () => {
    for (const [role, text] of [
      ['technologist', 'It is back'],
      ['physicist', 'Send a phantom'],
    ] as const) {
      await (await application.as(role)).post(`${at}/comments`).send({ text }).expect(201);
    }
    const notes = (await (await application.as('administrator')).get(`${at}/comments`).expect(200)).body;
    expect(notes.map(({ text, author }: { text: string; author: { role: string } }) => [author.role, text])).toEqual([
      ['technologist', 'It is back'],
      ['physicist', 'Send a phantom'],
    ]);
  });
  it('takes no empty note', async () => {
    const refused = await (await application.as('technologist')).post(`${at}/comments`).send({ text: ' ' }).expect(400);
    expect(refused.body.issues[0]).toEqual({ path: ['text'], message: 'an empty note cannot be saved' });
  });
});

describe('a finding', () => {
  it('is replaced by a new version; the former stays in the timeline', async () => {
    const agent = await application.as('lead-technologist');
    const write = (text: string) =>
      agent.post(`${at}/findings`).send({ cause: 'periodic-motion', confidence: 'reproduced', text }).expect(200);
    await write('A pump');
    const second = await write('The table');
    expect(second.body.finding).toMatchObject({ text: 'The table', author: { role: 'lead-technologist' } });
    const texts = (await agent.get(`${at}/timeline`)).body.map(({ text }: { text: string }) => text);
    expect(texts.filter((text: string) => /A pump|The table/.test(text))).toEqual([
      'Periodic motion (reproduced): The table',
      'Periodic motion (reproduced): A pump',
    ]);
  });
  it('names a cause of the catalogue or none', async () => {
    const agent = await application.as('physicist');
    const refused = await agent.post(`${at}/findings`).send({ cause: 'gremlins', confidence: 'consistent', text: 'x' }).expect(400);
    expect(refused.body.issues[0].path).toEqual(['cause']);
  });
});
