/**
 * A secondary capture may show a name. Until whoever uploaded it has looked and said that it does not, it is there for them alone, and on no case
 * (`requireImage` and the attaching of images see to that); one that does show text is taken away by them, values and all.
 */
import { confirmNoText, countImagesWithValues, removeUnconfirmed } from '../../db/queries/images';
import type { Image } from '../contract/images';
import type { Dependencies } from '../dependencies';
import { AppError } from '../errors';
import { describeImage, requireImage } from './image-source';
import type { Caller } from './sessions';

export async function confirmNoTextOn({ db }: Pick<Dependencies, 'db'>, caller: Caller, imageId: string): Promise<Image> {
  const row = await requireImage(db, caller, imageId);
  if (row.confirmedNoText === null)
    throw new AppError('not-computable', { detail: 'This is no secondary capture: nobody need look for text' });
  const confirmed = await confirmNoText(db, caller.departmentId, imageId);
  if (confirmed === undefined) throw new AppError('not-found');
  return describeImage(confirmed);
}

export async function discardImage({ db, objects }: Pick<Dependencies, 'db' | 'objects'>, caller: Caller, imageId: string): Promise<void> {
  const row = await requireImage(db, caller, imageId);
  const isRemoved = row.confirmedNoText === false && (await removeUnconfirmed(db, caller.departmentId, imageId));
  if (!isRemoved) throw new AppError('not-allowed', { detail: 'Only a secondary capture that nobody confirmed can be taken away' });
  if ((await countImagesWithValues(db, row.valuesDigest)) === 0) await objects.remove(row.valuesDigest, 0);
}
