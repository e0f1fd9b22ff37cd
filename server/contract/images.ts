/** Images: upload, what is known of one, its pixels and its k-space. */
import { z } from 'zod';
import { correctableFactsSchema, frameFactsSchema, scanFactsSchema } from './facts';
import { everyMember, identifier, route } from './route';

export const components = ['magnitude', 'phase', 'real', 'imaginary', 'complex'] as const;

/** `measured`: encoded in its own plane, so that its k-space means something. `look-only`: derived, reformatted or captured: it may be looked
 *  at, and is not analysed as if measured; a warning says why. */
export const uses = ['measured', 'look-only'] as const;
/** `derived`: the transform of a stored image, which is not the scanner's raw data. `raw`: the samples themselves. */
export const kspaceOrigins = ['derived', 'raw'] as const;

export const warningSchema = z.object({ code: z.string(), text: z.string() });

export const imageSchema = z.object({
  id: identifier,
  rows: z.number().int(),
  columns: z.number().int(),
  frames: z.number().int(),
  component: z.enum(components),
  use: z.enum(uses),
  kspace: z.enum(kspaceOrigins),
  /** A secondary capture may show a name in its pixels. `false`: whoever uploaded it has not looked yet, sees it alone, and it cannot be put on a
   *  case; `true`: looked, and there is no text; null: nobody need look. */
  confirmedNoText: z.boolean().nullable(),
  /** Row, column; null where the header is silent: millimetres are then unknown, and 1 mm is assumed in planes. */
  spacingMm: z.tuple([z.number(), z.number()]).nullable(),
  /** A robust range of the stored values for the first window: 1st and 99.8th percentile. */
  range: z.tuple([z.number(), z.number()]),
  acquisition: scanFactsSchema,
  /** One entry a frame. */
  frameFacts: z.array(frameFactsSchema),
  /** The same for all images of a series; null where the header names none. */
  series: z.string().nullable(),
  warnings: z.array(warningSchema),
  /** DICOM tags as `GGGG,EEEE`. Names and values are not repeated: they are gone. */
  deidentification: z.object({ removed: z.array(z.string()), replaced: z.array(z.string()) }),
});
export type Image = z.infer<typeof imageSchema>;

/** Why a file was not taken. The list is closed; `reason` says it in words a technologist can act on. */
export const refusalCodes = [
  'empty',
  'not-dicom',
  'truncated',
  'too-large',
  'transfer-syntax',
  'not-mr',
  'no-pixels',
  'multi-frame',
  'mosaic',
  'not-magnitude',
  'colour',
  'bit-depth',
  'size',
  'burned-in-text',
  'too-slow',
  'unreadable',
  'encrypted',
  'archive',
  'not-cartesian',
  'raw-kind',
] as const;
export type RefusalCode = (typeof refusalCodes)[number];

export const refusalSchema = z.object({ name: z.string(), code: z.enum(refusalCodes), reason: z.string() });
export type Refusal = z.infer<typeof refusalSchema>;
export const uploadResultSchema = z.object({ images: z.array(imageSchema), refused: z.array(refusalSchema) });
export type UploadResult = z.infer<typeof uploadResultSchema>;

const imageParams = z.object({ imageId: identifier });

/** 201 with what was accepted; 422 with the same body when nothing was. */
export const uploadImages = route({
  method: 'post',
  path: '/api/images',
  summary: 'Upload DICOM files, field `files`',
  access: everyMember,
  takes: 'multipart',
  status: 201,
  output: uploadResultSchema,
});

export const readImage = route({
  method: 'get',
  path: '/api/images/:imageId',
  summary: 'Facts of an image',
  access: everyMember,
  params: imageParams,
  output: imageSchema,
});

export const confirmNoText = route({
  method: 'patch',
  path: '/api/images/:imageId',
  summary: 'Say, after looking, that a secondary capture shows no name and no text. Only whoever uploaded it may',
  access: everyMember,
  params: imageParams,
  body: z.object({ confirmedNoText: z.literal(true) }),
  output: imageSchema,
});

export const discardImage = route({
  method: 'delete',
  path: '/api/images/:imageId',
  summary: 'Take away a secondary capture that does show text. Only whoever uploaded it may, before it is confirmed',
  access: everyMember,
  params: imageParams,
  status: 204,
});

/** An image that makes a complex one together with another. */
export const pairSchema = z.object({ imageId: identifier, component: z.enum(components) });
export const readPairs = route({
  method: 'get',
  path: '/api/images/:imageId/pairs',
  summary: 'Images of the same exam and place with which this one makes a complex image',
  access: everyMember,
  params: imageParams,
  output: z.array(pairSchema),
});

/** 422 with the reason where the two do not belong together. */
export const makeComplexImage = route({
  method: 'post',
  path: '/api/images/complex',
  summary: 'Make a complex image of magnitude and phase, or of real and imaginary part',
  access: everyMember,
  status: 201,
  body: z.union([z.object({ magnitudeId: identifier, phaseId: identifier }), z.object({ realId: identifier, imaginaryId: identifier })]),
  output: imageSchema,
});

export const correctFacts = route({
  method: 'patch',
  path: '/api/images/:imageId/facts',
  summary: 'Set scan facts that the header does not carry, or carries wrongly',
  access: everyMember,
  params: imageParams,
  body: correctableFactsSchema,
  output: imageSchema,
});

export const readPixels = route({
  method: 'get',
  path: '/api/images/:imageId/pixels',
  summary: 'Stored values (domain=image), their transform (kspace), or that of their magnitude (kspaceOfImage) as planes',
  access: everyMember,
  params: imageParams,
  query: z.object({
    frame: z.coerce.number().int().min(0).default(0),
    domain: z.enum(['image', 'kspace', 'kspaceOfImage']).default('image'),
  }),
  answers: 'binary',
});

export const readThumbnail = route({
  method: 'get',
  path: '/api/images/:imageId/thumbnail',
  summary: 'A small PNG of a frame or of its log-magnitude k-space',
  access: everyMember,
  params: imageParams,
  query: z.object({ frame: z.coerce.number().int().min(0).default(0), domain: z.enum(['image', 'kspace']).default('image') }),
  answers: 'binary',
});

/** One thing that the scan facts imply: a readout gradient, where a ghost falls. `value` is null where a fact is missing. */
export const implicationSchema = z.object({
  id: z.string(),
  label: z.string(),
  value: z.number().nullable(),
  unit: z.string(),
  formula: z.string(),
  because: z.string().optional(),
});
export const readImplications = route({
  method: 'get',
  path: '/api/images/:imageId/implications',
  summary: 'What the scan facts imply, worked out: gradient, hertz per millimetre, where a ghost of a typed frequency falls',
  access: everyMember,
  params: imageParams,
  query: z.object({ ghostFrequencyHz: z.coerce.number().min(0).max(1000).optional() }),
  output: z.array(implicationSchema),
});
