/** Planes as an answer: the bytes, and the header that describes them. */
import type { Request } from 'express';
import type { PlaneForm, Planes } from '../../workers/job';
import { displayMediaType, planesHeader, type PlaneHeader } from '../contract/planes';
import type { Binary } from '../serve';

export type { PlaneForm };

/** The form that a client asks for with Accept; exact unless it names the display form. */
export const formAskedFor = (request: Request): PlaneForm => (request.headers.accept?.includes(displayMediaType) ? 'display' : 'exact');

export function planesAnswer({ planes, bytes }: Planes, form: PlaneForm, headers: Readonly<Record<string, string>> = {}): Binary {
  const described: PlaneHeader[] = planes;
  return {
    mediaType: form === 'display' ? displayMediaType : 'application/octet-stream',
    bytes,
    headers: { [planesHeader]: JSON.stringify(described), Vary: 'Accept', ...headers },
  };
}
