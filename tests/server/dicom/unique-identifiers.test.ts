/** Unique identifiers: what stands in their place leads nowhere, and is the same whenever the same was there. */
import { departmentKey, replacedUid } from '../../../server/dicom/unique-identifiers';
import { accepted, madeFile } from './made-image';

const server = new TextEncoder().encode('a server key of thirty-two bytes, or more');
const key = departmentKey(server, 'one department');

test('is the same for the same identifier, another for another, and another in another department', () => {
  expect(replacedUid(key, '1.2.3')).toBe(replacedUid(key, '1.2.3'));
  expect(replacedUid(key, '1.2.4')).not.toBe(replacedUid(key, '1.2.3'));
  expect(replacedUid(departmentKey(server, 'another'), '1.2.3')).not.toBe(replacedUid(key, '1.2.3'));
});

test('is a valid identifier: 2.25. and decimals, at most 64 characters (DICOM PS3.5 section 9.1 and annex B.2)', () => {
  for (let n = 0; n < 200; n++) expect(replacedUid(key, `1.2.${n}`)).toMatch(/^2\.25\.(0|[1-9]\d{0,38})$/);
});

test('two images of a series keep the same series and other images', () => {
  const image = (name: string) => accepted(madeFile({ uids: { study: '2.25.10', series: '2.25.20', image: name } })).identifiers;
  const [one, other] = [image('2.25.31'), image('2.25.32')];
  expect(one.series).toBe(other.series);
  expect(one.study).toBe(other.study);
  expect(one.image).not.toBe(other.image);
  expect(Object.values(one).join()).not.toMatch(/2\.25\.(10|20|31)\b/);
  expect(one.frameOfReference).toBeNull();
});
