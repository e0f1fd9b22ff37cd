/** Free text of a request that looks like a patient's name, date or number is saved only when somebody was asked about it. */
import { questionedFields } from '../contract/questioned-text';
import { AppError } from '../errors';

type Body = Readonly<Record<string, unknown>>;

/** Throws `text-questioned` at each text that nobody was asked about. */
export function refuseQuestioned(body: Body): void {
  const questioned = body.confirmedText === true ? [] : questionedFields(body);
  if (questioned.length === 0) return;
  const issues = questioned.map(({ field, question }) => ({ path: [field], message: question }));
  throw new AppError('text-questioned', { detail: issues[0]?.message, issues });
}

/** The body without the confirmation, which is not kept. */
export function unquestioned<B extends Body & { readonly confirmedText?: boolean | undefined }>(body: B): Omit<B, 'confirmedText'> {
  refuseQuestioned(body);
  const { confirmedText: _confirmed, ...kept } = body;
  return kept;
}
