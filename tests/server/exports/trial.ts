/** A case with a trial on a real head slice, and the files of it. */
import type { Response } from 'supertest';
import type { Trial } from '../../../server/contract/case-parts';
import type { TrialFile } from '../../../server/contract/exports';
import type { Image } from '../../../server/contract/images';
import type { Application } from '../application';
import { motionRecipe, uploadOne } from '../files';
import { binary } from '../planes';

export interface Kept {
  readonly caseId: string;
  readonly caseNumber: number;
  readonly image: Image;
  readonly trial: Trial;
}

export async function keepTrialOf(application: Application, file: Buffer, recipe: object = motionRecipe()): Promise<Kept> {
  const image = await uploadOne(application, file);
  const agent = await application.as('technologist');
  const filed = await agent
    .post('/api/cases')
    .send({ title: 'Ghosts over the brain', images: [{ imageId: image.id, role: 'bad' }] })
    .expect(201);
  const trial = await agent.post(`/api/cases/${filed.body.id}/trials`).send({ imageId: image.id, recipe }).expect(201);
  return { caseId: filed.body.id, caseNumber: filed.body.number, image, trial: trial.body };
}

export async function fileOf(application: Application, { caseId, trial }: Kept, file: TrialFile): Promise<Response> {
  const agent = await application.as('technologist');
  return agent.get(`/api/cases/${caseId}/trials/${trial.id}/${file}`).buffer().parse(binary);
}
