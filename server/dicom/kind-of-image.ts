/**
 * Is this an image that is taken, and what is it good for? Refusals each have one reason; their order puts the reason first that exporting the
 * same image again could not cure. Captured, derived and reformatted images were not encoded in their own plane: they may be looked at.
 * Attributes: DICOM PS3.3 C.7.6.1 (Image Type), C.8.3.1, C.8.6.1 (Conversion Type), C.8.13.3.
 */
import type { Image } from '../contract/images';
import type { Header } from './header';
import { refuse, type Refused } from './refusal';
import type { Warning } from './warnings';

export const mrImageStorage = '1.2.840.10008.5.1.4.1.1.4';
const enhancedMr = new Set(['1.2.840.10008.5.1.4.1.1.4.1', '1.2.840.10008.5.1.4.1.1.4.4']);
const enhancedMrColour = '1.2.840.10008.5.1.4.1.1.4.3';
const spectroscopy = '1.2.840.10008.5.1.4.1.1.4.2';
const secondaryCapture = '1.2.840.10008.5.1.4.1.1.7';

export interface Kind {
  readonly use: Image['use'];
  /** `false` where somebody has to look for text in the pixels first. */
  readonly confirmedNoText: false | null;
  readonly warnings: readonly Warning[];
}

export function kindOf(header: Header): Kind | Refused {
  for (const check of [otherModalities, burnedInText, colour]) {
    const refused = check(header);
    if (refused !== undefined) return refused;
  }
  if (isCaptured(header)) return { use: 'look-only', confirmedNoText: false, warnings: [captured] };
  const made = computed(header) ?? reformatted(header);
  return { use: made?.use ?? 'measured', confirmedNoText: null, warnings: made === undefined ? [] : [made.warning] };
}

type Check = (header: Header) => Refused | undefined;

const isCaptureClass = (sopClass: string | undefined): boolean =>
  sopClass === secondaryCapture || sopClass?.startsWith(`${secondaryCapture}.`) === true;

/** Conversion Type belongs to secondary captures and scanned films, whatever class they call themselves. */
const isCaptured = (header: Header): boolean => isCaptureClass(header.text('sopClass')) || header.text('conversionType') !== undefined;

/** Captures of an MR console come as MR or as `other`. */
const otherModalities: Check = (header) => {
  const modality = header.text('modality');
  const sopClass = header.text('sopClass');
  if (modality === undefined) return refuse('not-mr', 'The header does not say that this is an MR image (no modality).');
  if (modality !== 'MR' && !(modality === 'OT' && isCaptureClass(sopClass)))
    return refuse('not-mr', `${modalityInWords(modality)} Only MR images are taken.`);
  if (sopClass === spectroscopy) return refuse('not-mr', 'This is MR spectroscopy: it holds spectra and no image.');
  const isImage = sopClass === undefined || sopClass === mrImageStorage || enhancedMr.has(sopClass) || sopClass === enhancedMrColour;
  return isImage || isCaptureClass(sopClass)
    ? undefined
    : refuse('not-mr', 'This comes from an MR scanner but is no MR image (a report, raw data or a file of the maker’s own kind).');
};

/** Two capital letters are a modality; anything else is not repeated. */
const modalityInWords = (modality: string): string =>
  /^[A-Z]{2}$/.test(modality) ? `The modality is ${modality}.` : 'The modality is another one.';

const burnedInText: Check = (header) =>
  header.text('burnedInAnnotation') === 'YES'
    ? refuse(
        'burned-in-text',
        'The header says that text is burned into the pixels, which may name the patient. Send the image without annotations.',
      )
    : undefined;

const colour: Check = (header) => {
  const photometric = header.text('photometricInterpretation') ?? 'MONOCHROME2';
  const isGrey = /^MONOCHROME[12]$/.test(photometric) && (header.number('samplesPerPixel') ?? 1) === 1;
  if (isGrey && header.text('sopClass') !== enhancedMrColour) return undefined;
  return refuse('colour', 'This is a colour image; only grey images are taken. Colour maps and screens hold no signal.');
};

const lookOnly = 'It can be looked at; nothing is simulated on it.';

const captured: Warning = {
  code: 'secondary-capture',
  text: `This is a secondary capture, a picture of a screen or of a film, and not the image itself. ${lookOnly} It may show a name: whoever sent it looks first.`,
};

/** Image Type words of images that were computed from others rather than encoded in their own plane. */
const derivedWords = new Set(
  'DERIVED SECONDARY PROJECTION MIP MINIP MNIP REFORMATTED RESAMPLED ADC EADC FA TENSOR TRACEW SUB SUBTRACTION ADD MEAN COMPOSED SWI PERFUSION TTP RCBV RCBF'.split(
    ' ',
  ),
);

interface Made {
  readonly use: Image['use'];
  readonly warning: Warning;
}

/** `B0 MAP`, `T1 MAP`: parameters, not signal (common practice); a phase map is a phase image. */
const isMap = (value: string): boolean => value.endsWith(' MAP') && value !== 'PHASE MAP';

function computed(header: Header): Made | undefined {
  const values = [...header.texts('imageType'), ...header.texts('frameType')];
  const known = values.map((value) => (value.startsWith('PROJECTION') ? 'PROJECTION' : isMap(value) ? 'MAP' : value));
  const words = [...new Set(known.filter((value) => derivedWords.has(value) || value === 'MAP'))];
  if (words.length === 0) return undefined;
  const text = `The image was computed from others (${words.join(', ')}): its k-space does not show how it was acquired. ${lookOnly}`;
  return { use: 'look-only', warning: { code: 'derived', text } };
}

/** Some scanners write MPR into originals too: where the first value says ORIGINAL, the word is a doubt and no more. */
function reformatted(header: Header): Made | undefined {
  const values = header.texts('imageType');
  if (!values.includes('MPR')) return undefined;
  if (values[0] !== 'ORIGINAL') {
    const text = `The image was reformatted (MPR): its k-space does not show how it was acquired. ${lookOnly}`;
    return { use: 'look-only', warning: { code: 'reformatted', text } };
  }
  const text = 'The header says MPR: if the image was reformatted, its k-space does not show how it was acquired.';
  return { use: 'measured', warning: { code: 'reformatted', text } };
}
