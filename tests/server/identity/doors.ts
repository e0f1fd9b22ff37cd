/**
 * Every way by which a file can come in. A new door is a new line here: it sends `file` under `name`, with whatever the way itself can carry of a
 * patient (headers, an address, titles of an association), and gives back the images that were made of it.
 * What a scanner pushes has a test of its own beside its protocol: tests/server/push/canary.test.ts.
 */
import type { Application } from '../application';
import { givenName, patientNumber, surname } from './canary-file';

export interface Door {
  readonly title: string;
  readonly send: (application: Application, file: Buffer, name: string) => Promise<{ id: string }[]>;
}

const headers = {
  'User-Agent': `console of ${surname}`,
  Referer: `https://worklist.example/${patientNumber}`,
  'X-Patient-Name': `${surname}^${givenName}${givenName}`,
  From: `${surname}@ward.example`,
  'X-Request-Id': patientNumber,
  'X-Forwarded-For': surname,
};

export const doors: readonly Door[] = [
  {
    title: 'upload by multipart, with the patient in headers, address and file name',
    send: async (application, file, name) => {
      const agent = await application.as('technologist');
      const answer = await agent
        .post(`/api/images?patient=${surname}&id=${patientNumber}`)
        .set(headers)
        .attach('files', file, name)
        .field('comment', `${surname} ${patientNumber}`)
        .expect(201);
      return answer.body.images;
    },
  },
];
