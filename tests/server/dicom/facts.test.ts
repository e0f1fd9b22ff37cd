/**
 * The facts of a scan, trap by trap. Each trap was met in a real header, or follows from the standard: DICOM PS3.3 C.8.3.1 for the
 * attributes and their units. Ranges of what is plausible are common practice.
 */
import type { FactName } from '../../../server/contract/facts';
import type { Attributes } from '../../../server/dicom/write';
import { readMade } from './made-image';

type Expected = { value: unknown; origin: string };
const is = (value: unknown, origin = 'header'): Expected => ({ value, origin });
const doubtful = (value: unknown = null) => is(value, 'doubtful');
const absent = is(null, 'absent');

const factOf = (name: FactName, attributes: Attributes) => readMade(attributes).facts[name];
const noteOf = (name: FactName, attributes: Attributes) => factOf(name, attributes).note ?? '';
const warned = (attributes: Attributes) => readMade(attributes).warnings.map(({ code }) => code);

/** Frequency rows, frequency columns, phase rows, phase columns. */
const phaseInColumns = [256, 0, 0, 192];
const phaseInRows = [0, 256, 192, 0];

describe('phase encoding', () => {
  test.each<[string, Attributes, Expected]>([
    ['COL, confirmed by the matrix', { phaseEncodingDirection: 'COL', acquisitionMatrix: phaseInColumns }, is('column')],
    ['ROW, confirmed by the matrix', { phaseEncodingDirection: 'ROW', acquisitionMatrix: phaseInRows }, is('row')],
    ['COLUMN, as enhanced files write it', { phaseEncodingDirection: 'COLUMN', acquisitionMatrix: phaseInColumns }, is('column')],
    ['COL against the matrix', { phaseEncodingDirection: 'COL', acquisitionMatrix: phaseInRows }, doubtful()],
    ['ROW against the matrix', { phaseEncodingDirection: 'ROW', acquisitionMatrix: phaseInColumns }, doubtful()],
    ['COL without a matrix', { phaseEncodingDirection: 'COL' }, is('column')],
    ['COL with a matrix of noise', { phaseEncodingDirection: 'COL', acquisitionMatrix: [1, 2, 3, 4] }, is('column')],
    ['the matrix alone, phase in rows', { acquisitionMatrix: phaseInRows }, is('row', 'worked-out')],
    ['the matrix alone, phase in columns', { acquisitionMatrix: phaseInColumns }, is('column', 'worked-out')],
    ['OTHER, even beside a matrix', { phaseEncodingDirection: 'OTHER', acquisitionMatrix: phaseInRows }, doubtful()],
    ['silence', {}, absent],
    ['a matrix of noise alone', { acquisitionMatrix: [0, 0, 0, 0] }, absent],
  ])('%s', (_, attributes, expected) => {
    expect(factOf('phaseEncode', attributes)).toMatchObject(expected);
  });

  test('where it is unknown, a warning asks for it; where it is known, none does', () => {
    expect(warned({})).toContain('phase-encode-unknown');
    expect(warned({ phaseEncodingDirection: 'COL', acquisitionMatrix: phaseInRows })).toContain('phase-encode-unknown');
    expect(warned({ phaseEncodingDirection: 'COL' })).not.toContain('phase-encode-unknown');
  });
});

describe('the acquisition matrix', () => {
  test.each<[string, Attributes, Expected, Expected]>([
    ['phase in columns', { acquisitionMatrix: phaseInColumns }, is(256), is(192)],
    ['phase in rows', { acquisitionMatrix: phaseInRows }, is(256), is(192)],
    ['three values', { acquisitionMatrix: [0, 256, 192] }, doubtful(), doubtful()],
    ['thirteen values', { acquisitionMatrix: [0, 256, 192, 0, 1, 2, 3, 4, 5, 6, 7, 8, 9] }, doubtful(), doubtful()],
    ['4096 at most', { acquisitionMatrix: [0, 4096, 4096, 0] }, is(4096), is(4096)],
    ['more than 4096', { acquisitionMatrix: [0, 4097, 192, 0] }, doubtful(), doubtful()],
    ['one zero', { acquisitionMatrix: [0, 256, 192, 1] }, doubtful(), doubtful()],
    ['three zeros', { acquisitionMatrix: [0, 256, 0, 0] }, doubtful(), doubtful()],
    ['zeros at the wrong places', { acquisitionMatrix: [256, 192, 0, 0] }, doubtful(), doubtful()],
    ['silence', {}, absent, absent],
  ])('%s', (_, attributes, readout, phase) => {
    expect(factOf('acquiredReadout', attributes)).toMatchObject(readout);
    expect(factOf('acquiredPhase', attributes)).toMatchObject(phase);
  });

  test('an image with more pixels than samples was interpolated', () => {
    expect(warned({ acquisitionMatrix: [0, 16, 12, 0] })).toContain('interpolated');
    expect(warned({ acquisitionMatrix: [0, 16, 16, 0] })).not.toContain('interpolated');
  });
});

describe('field strength and imaging frequency', () => {
  test.each<[string, Attributes, Expected]>([
    ['tesla', { fieldStrength: 1.5, imagingFrequency: 63.86 }, is(1.5)],
    ['15000 gauss', { fieldStrength: 15000, imagingFrequency: 63.86 }, is(1.5, 'worked-out')],
    ['3000 gauss, an open magnet', { fieldStrength: 3000 }, is(0.3, 'worked-out')],
    ['50 is still tesla', { fieldStrength: 50 }, is(50)],
    ['a rounded 1.4939999580383', { fieldStrength: '1.4939999580383', imagingFrequency: 63.6 }, is(1.4939999580383)],
    ['nominal 3 at 123.25 MHz', { fieldStrength: 3, imagingFrequency: 123.25 }, is(3)],
    ['3 T at 63.86 MHz', { fieldStrength: 3, imagingFrequency: 63.86 }, doubtful(3)],
    ['3 T at 49.9 MHz, of phosphorus', { fieldStrength: 3, imagingFrequency: 49.9, imagedNucleus: '31P' }, is(3)],
    ['frequency alone', { imagingFrequency: 123.25 }, is(2.895, 'worked-out')],
    ['frequency of another nucleus alone', { imagingFrequency: 49.9, imagedNucleus: '31P' }, absent],
    ['nothing', {}, absent],
    ['zero', { fieldStrength: 0 }, doubtful()],
    ['no number', { fieldStrength: 'high' }, doubtful()],
  ])('%s', (_, attributes, expected) => {
    expect(factOf('fieldStrengthTesla', attributes)).toMatchObject(expected);
  });

  test('a nominal strength is noted beside the one that the frequency implies', () => {
    // 123.25 MHz over 42.577 MHz/T.
    expect(noteOf('fieldStrengthTesla', { fieldStrength: 3, imagingFrequency: 123.25 })).toContain('2.895 T');
    expect(noteOf('fieldStrengthTesla', { fieldStrength: 1.5, imagingFrequency: 63.86 })).toBe('');
  });
});

describe('bandwidth per pixel', () => {
  test.each<[string, Attributes, Expected]>([
    ['31.25 of GE', { pixelBandwidth: 31.25, manufacturer: 'GE MEDICAL SYSTEMS' }, doubtful(31.25)],
    ['62.5 of GE', { pixelBandwidth: 62.5, manufacturer: 'GE Medical Systems' }, doubtful(62.5)],
    ['65 of GE', { pixelBandwidth: 65, manufacturer: 'GE MEDICAL SYSTEMS' }, is(65)],
    ['7812.5 of GE, echo planar', { pixelBandwidth: 7812.5, manufacturer: 'GE MEDICAL SYSTEMS' }, is(7812.5)],
    ['31.25 of another maker', { pixelBandwidth: 31.25, manufacturer: 'Tern' }, is(31.25)],
    ['a maker whose name only starts alike', { pixelBandwidth: 31.25, manufacturer: 'General Imaging' }, is(31.25)],
    ['15 of another maker', { pixelBandwidth: 15, manufacturer: 'Tern' }, doubtful(15)],
    ['3100', { pixelBandwidth: 3100 }, is(3100)],
    ['20000', { pixelBandwidth: 20000 }, doubtful()],
    ['zero', { pixelBandwidth: 0 }, doubtful()],
    ['silence', {}, absent],
  ])('%s', (_, attributes, expected) => {
    expect(factOf('bandwidthPerPixelHz', attributes)).toMatchObject(expected);
    expect(warned(attributes).includes('bandwidth-doubtful')).toBe(expected.origin === 'doubtful');
  });

  test('without a matrix, the note names the kilohertz and no hertz per pixel', () => {
    const note = noteOf('bandwidthPerPixelHz', { pixelBandwidth: 31.25, manufacturer: 'GE MEDICAL SYSTEMS' });
    expect(note).toContain('±31.25 kHz');
    expect(note).not.toContain('would be');
  });
});

describe('coverage of k-space', () => {
  const steps = (phaseEncodingSteps: number, more: Attributes = {}): Attributes => ({
    phaseEncodingSteps,
    acquisitionMatrix: [90, 0, 0, 90],
    ...more,
  });

  test.each<[string, Attributes, Expected]>([
    ['PFP', { scanOptions: ['PFP', 'FS'] }, is('phase')],
    ['PFF', { scanOptions: ['EPI_GEMS', 'PFF'] }, is('readout')],
    ['PFP and PFF', { scanOptions: ['PFF', 'PFP'] }, is('both')],
    ['other options', { scanOptions: 'FS' }, is('none', 'worked-out')],
    ['silence', {}, absent],
    ['PFP decides, whatever the lines', steps(56, { scanOptions: 'PFP' }), is('phase')],
    ['56 of 90 lines without the flag are a hint', steps(56, { scanOptions: 'FS' }), doubtful('none')],
    ['56 of 90 lines and silent options are a hint', steps(56), doubtful()],
    [
      '45 of 90 lines with a parallel imaging factor are none',
      steps(45, { parallelReductionFactor: 2, scanOptions: 'FS' }),
      is('none', 'worked-out'),
    ],
    [
      '80 of 90 lines with phase oversampling are none',
      steps(80, { sequenceVariant: ['SK', 'OSP'], scanOptions: 'FS' }),
      is('none', 'worked-out'),
    ],
    ['90 of 90 lines are all', steps(90, { scanOptions: 'FS' }), is('none', 'worked-out')],
  ])('partial Fourier: %s', (_, attributes, expected) => {
    expect(factOf('partialFourier', attributes)).toMatchObject(expected);
  });

  test.each<[string, Attributes, Expected]>([
    ['OSP', { sequenceVariant: ['SK', 'OSP'] }, is(true)],
    ['180 of 90 lines', steps(180), is(true, 'worked-out')],
    ['the attribute of enhanced files', { oversamplingPhase: '2D' }, is(true)],
    ['its NONE', { oversamplingPhase: 'NONE' }, is(false)],
    ['a variant without OSP proves nothing', { sequenceVariant: 'SK' }, absent],
  ])('phase oversampling: %s', (_, attributes, expected) => {
    expect(factOf('phaseOversampling', attributes)).toMatchObject(expected);
  });

  test.each<[string, Attributes, Expected]>([
    ['EP', { scanningSequence: ['EP', 'GR'] }, is(true)],
    ['the flag of enhanced files', { echoPlanarPulseSequence: 'YES' }, is(true)],
    ['the flag beside a research sequence', { scanningSequence: 'RM', echoPlanarPulseSequence: 'YES' }, is(true)],
    ['SE', { scanningSequence: 'SE' }, is(false)],
    ['silence', {}, absent],
  ])('echo planar: %s', (_, attributes, expected) => {
    expect(factOf('echoPlanar', attributes)).toMatchObject(expected);
  });

  test.each<[string, Attributes, Expected]>([
    ['56', { echoTrainLength: 56, scanningSequence: 'EP' }, is(56)],
    ['1 of an echo planar image', { echoTrainLength: 1, scanningSequence: 'EP' }, doubtful(1)],
    ['1 of a spin echo', { echoTrainLength: 1, scanningSequence: 'SE' }, is(1)],
    ['0', { echoTrainLength: 0 }, doubtful(0)],
  ])('echo train length: %s', (_, attributes, expected) => {
    expect(factOf('echoTrainLength', attributes)).toMatchObject(expected);
  });

  test.each<[string, Attributes, Expected]>([
    ['78.54 in 3D is an elliptical coverage', { percentSampling: 78.54, acquisitionType: '3D' }, doubtful(78.54)],
    ['78.54 in 2D is a share of lines', { percentSampling: 78.54, acquisitionType: '2D' }, is(78.54)],
    ['80 in 3D', { percentSampling: 80, acquisitionType: '3D' }, is(80)],
  ])('percent sampling: %s', (_, attributes, expected) => {
    expect(factOf('percentSampling', attributes)).toMatchObject(expected);
  });
});

describe('times, angles and counts', () => {
  test.each<[FactName, Attributes, Expected]>([
    ['repetitionTimeMs', { repetitionTime: '2300.00' }, is(2300)],
    ['repetitionTimeMs', { repetitionTime: 0 }, doubtful()],
    ['repetitionTimeMs', { repetitionTime: 19580417 }, doubtful()],
    ['echoTimeMs', { echoTime: '22' }, is(22)],
    ['echoTimeMs', { echoTime: '22 ms' }, doubtful()],
    ['inversionTimeMs', { inversionTime: 0 }, absent],
    ['inversionTimeMs', { inversionTime: 2500 }, is(2500)],
    ['flipAngleDegrees', { flipAngle: 15 }, is(15)],
    ['heartRatePerMinute', { heartRate: 0 }, absent],
    ['heartRatePerMinute', { heartRate: 72 }, is(72)],
    ['averages', { averages: 0.5 }, is(0.5)],
    ['averages', { averages: 0 }, doubtful()],
    ['accelerationFactor', { parallelReductionFactor: 2.5 }, is(2.5)],
    ['acquisitionType', { acquisitionType: '3D' }, is('3D')],
    ['acquisitionType', { acquisitionType: '4D' }, doubtful()],
    ['seriesNumber', { seriesNumber: 301 }, is(301)],
    ['seriesNumber', { seriesNumber: 19580417 }, doubtful()],
  ])('%s of %j', (name, attributes, expected) => {
    expect(factOf(name, attributes)).toMatchObject(expected);
  });
});

describe('geometry', () => {
  test.each<[FactName, Attributes, Expected]>([
    ['pixelSpacingMm', { pixelSpacing: [0.5, 0.75] }, is([0.5, 0.75])],
    ['pixelSpacingMm', { pixelSpacing: [0.5] }, doubtful()],
    ['pixelSpacingMm', { pixelSpacing: [0, 0.5] }, doubtful()],
    ['pixelSpacingMm', { pixelSpacing: [-0.5, 0.5] }, doubtful()],
    ['pixelSpacingMm', {}, absent],
    ['imagePositionMm', { imagePosition: [-110.5, -86.8, -10.2] }, is([-110.5, -86.8, -10.2])],
    ['imagePositionMm', { imagePosition: [1, 2] }, doubtful()],
    ['imageOrientation', { imageOrientation: [1, 0, 0, 0, 0.99096, 0.134158] }, is([1, 0, 0, 0, 0.99096, 0.134158])],
    ['imageOrientation', { imageOrientation: [1, 0, 0, 1, 0, 0] }, doubtful()],
    ['imageOrientation', { imageOrientation: [0, 0, 0, 0, 0, 0] }, doubtful()],
    ['imageOrientation', { imageOrientation: [1, 0, 0] }, doubtful()],
    ['patientPosition', { patientPosition: 'HFS' }, is('HFS')],
  ])('%s of %j', (name, attributes, expected) => {
    expect(factOf(name, attributes)).toMatchObject(expected);
  });

  test('spacing is that of the header, row first, or none with a warning', () => {
    expect(readMade({ pixelSpacing: [0.5, 0.75] }).spacingMm).toEqual([0.5, 0.75]);
    expect(readMade({}).spacingMm).toBeNull();
    expect(warned({})).toContain('spacing-missing');
    expect(warned({ pixelSpacing: [0.5, 0.75] })).not.toContain('spacing-missing');
  });
});

describe('time of day', () => {
  test.each<[string, Attributes, Expected]>([
    ['acquisition time', { acquisitionTime: '143415.123', contentTime: '150000' }, is('14:34:15', 'worked-out')],
    ['content time where there is no other', { contentTime: '143014' }, is('14:30:14', 'worked-out')],
    ['the old form with colons', { acquisitionTime: '09:29:41' }, is('09:29:41', 'worked-out')],
    ['hours and minutes', { acquisitionTime: '0929' }, is('09:29:00', 'worked-out')],
    ['date and time: the date is left behind', { acquisitionDateTime: '20010316143415.000000+0100' }, is('14:34:15', 'worked-out')],
    ['25 hours', { acquisitionTime: '251500' }, doubtful()],
    ['a date', { acquisitionTime: '1995.06.26' }, doubtful()],
  ])('%s', (_, attributes, expected) => {
    expect(factOf('timeOfDay', attributes)).toMatchObject(expected);
  });
});

describe('warnings of the header', () => {
  test.each<[string, Attributes]>([
    ['derived', { imageType: ['DERIVED', 'SECONDARY', 'ADC'] }],
    ['derived', { imageType: ['DERIVED', 'PRIMARY', 'PROJECTION IMAGE'] }],
    ['derived', { imageType: ['ORIGINAL', 'PRIMARY', 'MIP'] }],
    ['reformatted', { imageType: ['ORIGINAL', 'PRIMARY', 'MPR'] }],
    ['filtered', { imageType: ['ORIGINAL', 'PRIMARY', 'M', 'NORM', 'DIS2D'] }],
    ['filtered', { scanOptions: 'FILTERED_GEMS' }],
  ])('%s: %j', (code, attributes) => {
    expect(warned(attributes)).toContain(code);
  });

  test('every image is said to be a magnitude without its raw data, and a plain one nothing else of its making', () => {
    const codes = warned({ phaseEncodingDirection: 'ROW', pixelSpacing: [1, 1], imageType: ['ORIGINAL', 'PRIMARY', 'M', 'ND'] });
    expect(codes).toEqual(['magnitude-only']);
  });
});
