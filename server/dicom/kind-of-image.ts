/**
 * Is this an image that can be worked on: one plane of MR magnitude? Each check refuses for one reason; their order puts the
 * reason first that exporting the same image again could not cure. Attributes: DICOM PS3.3 C.7.6.1, C.8.3.1, C.8.13.3.
 */
import type { Header } from './header';
import { count, refuse, type Refused } from './refusal';

export const mrImageStorage = '1.2.840.10008.5.1.4.1.1.4';
const enhancedMr = new Set(['1.2.840.10008.5.1.4.1.1.4.1', '1.2.840.10008.5.1.4.1.1.4.4']);
const enhancedMrColour = '1.2.840.10008.5.1.4.1.1.4.3';
const spectroscopy = '1.2.840.10008.5.1.4.1.1.4.2';
const secondaryCapture = '1.2.840.10008.5.1.4.1.1.7';

/** Image Type values, from the third on, which say that the image is no magnitude: one letter on most scanners, words on some
 *  (common practice; the standard leaves these values to the maker). */
const otherComponents: Readonly<Record<string, string>> = {
  P: 'a phase image',
  PHASE: 'a phase image',
  'PHASE MAP': 'a phase image',
  R: 'the real part of a complex image',
  REAL: 'the real part of a complex image',
  I: 'the imaginary part of a complex image',
  IMAGINARY: 'the imaginary part of a complex image',
  MIXED: 'a mixture of complex components',
};

/** The private number by which one maker tells the component, where Image Type does not (from memory: GE, image kind). */
const privateComponents: readonly string[] = ['M', 'P', 'R', 'I'];
const privateCreatorOfComponents = 'GEMS_PARM_01';

type Check = (header: Header) => Refused | undefined;

export function refuseKindOfImage(header: Header): Refused | undefined {
  for (const check of [secondaryCaptures, otherModalities, burnedInText, enhanced, mosaic, multiFrame, colour, components]) {
    const refused = check(header);
    if (refused !== undefined) return refused;
  }
  return undefined;
}

const secondaryCaptures: Check = (header) => {
  const captured = header.text('sopClass')?.startsWith(secondaryCapture) === true || header.text('conversionType') !== undefined;
  if (!captured) return undefined;
  return refuse(
    'not-mr',
    'This is a secondary capture, a picture of a screen or of a film: it is not the image, and may show names. Send the original.',
  );
};

const otherModalities: Check = (header) => {
  const modality = header.text('modality');
  const sopClass = header.text('sopClass');
  if (modality === undefined) return refuse('not-mr', 'The header does not say that this is an MR image (no modality).');
  if (modality !== 'MR') return refuse('not-mr', `${modalityInWords(modality)} Only MR images are taken.`);
  if (sopClass === spectroscopy) return refuse('not-mr', 'This is MR spectroscopy: it holds spectra and no image.');
  const image = sopClass === undefined || sopClass === mrImageStorage || enhancedMr.has(sopClass) || sopClass === enhancedMrColour;
  return image
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

const enhanced: Check = (header) => {
  const sopClass = header.text('sopClass');
  if (sopClass === enhancedMrColour) return refuse('colour', 'This is a colour image; only greyscale magnitude is taken.');
  if (sopClass === undefined || !enhancedMr.has(sopClass)) return undefined;
  return refuse('multi-frame', 'This is an enhanced MR object: not read yet; export it as classic single-frame MR images.');
};

const mosaic: Check = (header) =>
  header.texts('imageType').includes('MOSAIC')
    ? refuse('mosaic', 'This is a mosaic, many slices tiled in one picture: its transform means nothing. Export the slices one by one.')
    : undefined;

const multiFrame: Check = (header) => {
  const frames = header.number('numberOfFrames') ?? 1;
  return frames > 1 ? refuse('multi-frame', `The file holds ${count(frames)} frames; only single images are read yet.`) : undefined;
};

const colour: Check = (header) => {
  const photometric = header.text('photometricInterpretation');
  if (photometric === 'MONOCHROME1') {
    // Its largest value is black, and how large that is, is not said: the zero of the signal, and with it k-space, would be a guess.
    return refuse(
      'not-magnitude',
      'The image is stored inverted (MONOCHROME1), so where its signal is zero cannot be told. Export the original image.',
    );
  }
  const grey = (photometric ?? 'MONOCHROME2') === 'MONOCHROME2' && (header.number('samplesPerPixel') ?? 1) === 1;
  return grey ? undefined : refuse('colour', 'This is a colour image; only greyscale magnitude is taken.');
};

const components: Check = (header) => {
  const complexImageComponent = header.text('complexImageComponent');
  const values = [...header.texts('imageType').slice(2), complexImageComponent ?? 'MAGNITUDE', privateComponent(header)];
  const other = values.map((value) => otherComponents[value]).find((words) => words !== undefined);
  if (other === undefined) return undefined;
  return refuse('not-magnitude', `This is ${other}; only magnitude images are taken yet. Send the magnitude image of the same scan.`);
};

function privateComponent(header: Header): string {
  if (header.text('geParametersCreator') !== privateCreatorOfComponents) return 'M';
  return privateComponents[header.number('geImageKind') ?? 0] ?? 'M';
}
