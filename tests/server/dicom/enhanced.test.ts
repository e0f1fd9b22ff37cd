/**
 * Enhanced MR: a fact of a frame is looked for in what the frame has for itself, then in what all frames share, then at the top level.
 * Where the attributes stand: DICOM PS3.3 C.7.6.16 and C.8.13.5. Values are made up.
 */
import type { FactName } from '../../../server/contract/facts';
import type { Attributes } from '../../../server/dicom/write';
import { accepted, refused, side } from './made-image';
import { acceptedAll, enhancedFile, groupTag } from './made-enhanced';

const shared: Attributes = {
  repetitionTime: 2300,
  flipAngle: 90,
  echoTrainLength: 8,
  effectiveEchoTime: 22,
  averages: 2,
  phaseEncodingDirection: 'ROW',
  readoutSteps: 256,
  phaseEncodingStepsInPlane: 192,
  percentSampling: 75,
  percentPhaseFieldOfView: 80,
  partialFourier: 'YES',
  partialFourierDirection: 'PHASE',
  parallelAcquisition: 'YES',
  parallelReductionFactor: 2,
  inversionTimes: 150,
  transmitterFrequency: 63.8615,
  pixelBandwidth: 244.14,
  receiveCoil: 'HEAD 8',
  transmitCoil: 'BODY',
  sliceThickness: 5,
  sliceSpacing: 6,
  pixelSpacing: [0.5, 0.75],
  imageOrientation: [1, 0, 0, 0, 1, 0],
};
const positions = [-10, -4, 2].map((z): Attributes => ({ imagePosition: [-100, -80, z] }));

describe('facts from functional groups', () => {
  const image = accepted(enhancedFile({ shared, perFrame: positions, attributes: { fieldStrength: 1.5, echoPulseSequence: 'SPIN' } }));
  test.each<[FactName, unknown, string?]>([
    ['repetitionTimeMs', 2300],
    ['flipAngleDegrees', 90],
    ['echoTrainLength', 8],
    ['echoTimeMs', 22],
    ['averages', 2],
    ['phaseEncode', 'row'],
    ['acquiredReadout', 256],
    ['acquiredPhase', 192],
    ['phaseEncodingSteps', 192],
    ['percentSampling', 75],
    ['percentPhaseFieldOfView', 80],
    ['partialFourier', 'phase'],
    ['accelerationFactor', 2],
    ['inversionTimeMs', 150],
    ['imagingFrequencyMHz', 63.8615],
    ['bandwidthPerPixelHz', 244.14],
    ['receiveCoil', 'HEAD 8'],
    ['transmitCoil', 'BODY'],
    ['sliceThicknessMm', 5],
    ['sliceSpacingMm', 6],
    ['pixelSpacingMm', [0.5, 0.75]],
    ['imageOrientation', [1, 0, 0, 0, 1, 0]],
    ['imagePositionMm', [-100, -80, -10]],
    ['scanningSequence', 'SE', 'worked-out'],
    ['fieldStrengthTesla', 1.5],
  ])('%s is %j', (name, value, origin = 'header') => {
    expect(image.facts[name]).toMatchObject({ value, origin });
  });

  test('are the same where the file is written with implicit VR', () => {
    const implicit = accepted(
      enhancedFile({ shared, perFrame: positions, vrEncoding: 'implicit', attributes: { echoPulseSequence: 'SPIN' } }),
    );
    expect(implicit.facts.repetitionTimeMs.value).toBe(2300);
    expect(implicit.frameFacts.map(({ positionMm }) => positionMm?.[2])).toEqual([-10, -4, 2]);
    expect(implicit.values).toEqual(image.values);
  });

  test('what the frame has for itself counts before what is shared, and this before the top level', () => {
    const attributes: Attributes = { repetitionTime: 1, averages: 1, pixelBandwidth: 100 };
    const { facts } = accepted(
      enhancedFile({ attributes, shared: { repetitionTime: 2, averages: 2 }, perFrame: [{ repetitionTime: 3 }, { repetitionTime: 4 }] }),
    );
    expect([facts.repetitionTimeMs.value, facts.averages.value, facts.bandwidthPerPixelHz.value]).toEqual([3, 2, 100]);
  });

  test('an attribute in a functional group where it does not belong is not looked at', () => {
    const stray = {
      tag: '5200,9229',
      vr: 'SQ',
      value: [[{ tag: groupTag('mrEcho'), vr: 'SQ', value: [[{ tag: '0018,0080', vr: 'DS', value: 2300 }]] }]],
    };
    expect(accepted(enhancedFile({ extra: [stray] })).facts.repetitionTimeMs.value).toBeNull();
  });

  test.each<[string, Attributes, unknown, string]>([
    ['NO', { partialFourier: 'NO' }, 'none', 'header'],
    ['along the readout', { partialFourier: 'YES', partialFourierDirection: 'FREQUENCY' }, 'readout', 'header'],
    ['along both', { partialFourier: 'YES', partialFourierDirection: 'COMBINATION' }, 'both', 'header'],
    ['along the slices only', { partialFourier: 'YES', partialFourierDirection: 'SLICE_SELECT' }, 'none', 'header'],
    ['along an axis that is not said', { partialFourier: 'YES' }, null, 'doubtful'],
  ])('partial Fourier %s', (_, attributes, value, origin) => {
    expect(accepted(enhancedFile({ shared: attributes })).facts.partialFourier).toMatchObject({ value, origin });
  });

  test('no parallel imaging is a factor of 1', () => {
    expect(accepted(enhancedFile({ shared: { parallelAcquisition: 'NO' } })).facts.accelerationFactor).toMatchObject({
      value: 1,
      origin: 'header',
    });
  });

  test('an elliptical coverage in 3D that the header names is no reduced resolution', () => {
    const attributes: Attributes = { coverageOfKspace: 'ELLIPTICAL', acquisitionType: '3D' };
    expect(accepted(enhancedFile({ attributes, shared: { percentSampling: 70 } })).facts.percentSampling).toMatchObject({
      value: 70,
      origin: 'doubtful',
    });
  });
});

describe('frames', () => {
  test('lie one after the other as stored, each with its own facts', () => {
    const image = accepted(
      enhancedFile({
        shared,
        perFrame: [
          {
            imagePosition: [0, 0, 7],
            effectiveEchoTime: 5,
            triggerDelay: 0,
            frameAcquisitionDateTime: '20200101101112.5',
            diffusionWeighting: 0,
          },
          {
            imagePosition: [0, 0, 3],
            effectiveEchoTime: 10,
            triggerDelay: 40,
            frameAcquisitionDateTime: '20200101101115',
            diffusionWeighting: 1000,
          },
        ],
      }),
    );
    expect(image.frameFacts).toEqual([
      { positionMm: [0, 0, 7], timeOfDay: '10:11:12', triggerDelayMs: 0, echoTimeMs: 5, label: 'b 0 s/mm²' },
      { positionMm: [0, 0, 3], timeOfDay: '10:11:15', triggerDelayMs: 40, echoTimeMs: 10, label: 'b 1000 s/mm²' },
    ]);
    expect([image.frames, image.values.length, image.values[0], image.values[side * side]]).toEqual([2, 512, 1, 1001]);
  });

  test('are rescaled each by its own slope and intercept, and the range spans them all', () => {
    const perFrame: Attributes[] = [
      { rescaleSlope: 2, rescaleIntercept: 0 },
      { rescaleSlope: 0.5, rescaleIntercept: 10 },
    ];
    const pixels = new Uint16Array(2 * side * side).fill(100);
    const image = accepted(enhancedFile({ perFrame, pixels }));
    expect([image.values[0], image.values[side * side]]).toEqual([200, 60]);
    expect(image.range).toEqual([60, 200]);
  });

  test('in different planes, or with another phase encoding axis, are images of their own', () => {
    const axial: Attributes = { imageOrientation: [1, 0, 0, 0, 1, 0], phaseEncodingDirection: 'ROW' };
    const coronal: Attributes = { imageOrientation: [1, 0, 0, 0, 0, -1], phaseEncodingDirection: 'COLUMN' };
    const images = acceptedAll(enhancedFile({ perFrame: [axial, coronal, axial] }));
    expect(images.map(({ frames, facts, values }) => [frames, facts.phaseEncode.value, values[0]])).toEqual([
      [2, 'row', 1],
      [1, 'column', 1001],
    ]);
    expect(images[0]?.values[side * side]).toBe(2001);
  });

  test('of magnitude and phase make one image each', () => {
    const attributes: Attributes = { complexImageComponent: 'MIXED' };
    const images = acceptedAll(
      enhancedFile({ attributes, perFrame: [{ complexImageComponent: 'MAGNITUDE' }, { complexImageComponent: 'PHASE' }] }),
    );
    expect(images.map(({ component, frames }) => [component, frames])).toEqual([
      ['magnitude', 1],
      ['phase', 1],
    ]);
  });

  test('of mixed components that no frame names are refused', () => {
    expect(refused(enhancedFile({ attributes: { complexImageComponent: 'MIXED' }, perFrame: [{}, {}] })).code).toBe('not-magnitude');
  });
});

describe('what is missing or malformed is taken as missing', () => {
  test.each<[string, Uint8Array]>([
    ['no functional groups at all', enhancedFile({ frames: 3 })],
    ['fewer groups than frames', enhancedFile({ frames: 3, perFrame: [{ imagePosition: [1, 2, 3] }] })],
    ['empty sequences', enhancedFile({ frames: 3, extra: ['5200,9229', '5200,9230'].map((tag) => ({ tag, vr: 'SQ', value: [] })) })],
    ['text where a sequence should be', enhancedFile({ frames: 3, extra: [{ tag: '5200,9230', vr: 'LO', value: 'none' }] })],
  ])('%s: the frames are there, their places are not known', (_, bytes) => {
    const image = accepted(bytes);
    expect(image.frames).toBe(3);
    expect(image.frameFacts.at(-1)).toEqual({ positionMm: null, timeOfDay: null, triggerDelayMs: null, echoTimeMs: null, label: null });
  });

  test.each([
    ['more frames than there are pixels for', 3],
    ['a thousand million frames', 1_000_000_000],
    ['no frame', 0],
  ])('%s is refused', (_, numberOfFrames) => {
    expect(refused(enhancedFile({ frames: 2, attributes: { numberOfFrames } })).code).toBe('size');
  });

  test('frames in more planes than a scan has are refused', () => {
    const perFrame = Array.from({ length: 65 }, (_, i): Attributes => {
      const angle = (i * Math.PI) / 65;
      return { imageOrientation: [Math.cos(angle), Math.sin(angle), 0, 0, 0, -1].map((cosine) => Number(cosine.toFixed(6))) };
    });
    expect(refused(enhancedFile({ perFrame })).code).toBe('multi-frame');
  });
});

describe('the account of what was removed', () => {
  test('does not name what was stored out of functional groups, and names everything else in them', () => {
    const other = {
      tag: '5200,9229',
      vr: 'SQ',
      value: [
        [
          {
            tag: groupTag('mrTiming'),
            vr: 'SQ',
            value: [
              [
                { tag: '0018,0080', vr: 'DS', value: 2300 },
                { tag: '0018,9239', vr: 'LO', value: 'X' },
              ],
            ],
          },
        ],
      ],
    };
    const { removed } = accepted(enhancedFile({ extra: [other] })).deidentification;
    expect(removed).toContain('0018,9239');
    for (const tag of ['0018,0080', '5200,9229', '0018,9112']) expect(removed).not.toContain(tag);
  });
});
