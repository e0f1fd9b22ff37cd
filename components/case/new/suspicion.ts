/**
 * Free text that looks as if it named a patient is questioned before it is saved. The signs are common practice: a form of address
 * before a capital, a full date, a run of six digits and more. It asks; the person decides.
 */
const signs: readonly { readonly sign: RegExp; readonly question: string }[] = [
  { sign: /\b(?:Mr|Mrs|Ms|Miss|Herr|Frau|Mme|Sr|Sra)\.?\s+\p{Lu}/u, question: 'Is this a name? Say “the patient”.' },
  {
    sign: /\b\d{1,2}[./-]\d{1,2}[./-](?:19|20)\d{2}\b|\b(?:19|20)\d{2}-\d{2}-\d{2}\b/,
    question: 'Is this a date of birth or of the exam? Leave it out.',
  },
  { sign: /\b\d{6,}\b/, question: 'Is this a patient number? Leave it out.' },
];

export const suspicionOf = (text: string): string | undefined => signs.find(({ sign }) => sign.test(text))?.question;
