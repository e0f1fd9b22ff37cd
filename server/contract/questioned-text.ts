/**
 * Free text that looks as if it named a patient is questioned before it is saved: the client asks, and the server saves it only when the
 * request says that a person was asked. The signs are common practice: a form of address before a capital, surname and given name as DICOM
 * writes them, a full date, a run of six digits and more. It asks; the person decides.
 */
import { z } from 'zod';

const signs: readonly { readonly sign: RegExp; readonly question: string }[] = [
  { sign: /\b(?:Mr|Mrs|Ms|Miss|Herr|Frau|Mme|Sr|Sra)\.?\s+\p{Lu}/u, question: 'Is this a name? Say “the patient”.' },
  { sign: /\p{L}{2,}\^\p{L}{2,}/u, question: 'Is this a name? Say “the patient”.' },
  {
    sign: /\b\d{1,2}[./-]\d{1,2}[./-](?:19|20)\d{2}\b|\b(?:19|20)\d{2}-\d{2}-\d{2}\b/,
    question: 'Is this a date of birth or of the exam? Leave it out.',
  },
  { sign: /\b\d{6,}\b/, question: 'Is this a patient number? Leave it out.' },
];

/** What to ask about a text; undefined where nothing in it is like identity. */
export const questionOf = (text: string): string | undefined => signs.find(({ sign }) => sign.test(text))?.question;

/** In the body of every request with free text: true where a person was asked and keeps the text. */
export const confirmedText = z.boolean().optional();

export interface QuestionedField {
  readonly field: string;
  readonly question: string;
}

/** The fields of requests into which a person writes sentences. Others hold dates and identifiers by right. */
const freeTexts: ReadonlySet<string> = new Set([
  ...['title', 'description', 'tried', 'bodyRegion', 'protocol', 'text', 'note', 'lesson', 'reason'],
]);

/** The free texts of a request's body that are questioned, in its order. */
export function questionedFields(body: Readonly<Record<string, unknown>>): QuestionedField[] {
  return Object.entries(body).flatMap(([field, text]) => {
    const question = freeTexts.has(field) && typeof text === 'string' ? questionOf(text) : undefined;
    return question === undefined ? [] : [{ field, question }];
  });
}
