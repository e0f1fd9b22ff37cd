/**
 * Derived DICOM: valid by the standard's rules as dicom3tools knows them, exact but for the words burned in, in its place, and of nobody.
 */
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import dicomParser, { type DataSet } from 'dicom-parser';
import { causes } from '../../../recon/causes';
import { exportedFile } from '../../../workers/exported-file';
import { exportedWords, marked } from '../../../workers/exported-mark';
import { discFile, headFile } from '../files';
import { dciodvfy } from '../debian-tool';
import { plain, simulatedOn, withCauses, type Simulated } from './simulated';

const folder = mkdtempSync(join(tmpdir(), 'pickglass-derived-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

const derived = ({ simulation, about }: Simulated): Buffer => Buffer.from(exportedFile(simulation, 'derived.dcm', about));
const numbers = (dataSet: DataSet, tag: string): number[] => (dataSet.string(tag) ?? '').split('\\').map(Number);

function pixelsOf(dataSet: DataSet): Uint16Array {
  const { dataOffset, length } = dataSet.elements.x7fe00010 ?? { dataOffset: 0, length: 0 };
  return new Uint16Array(Uint8Array.from(dataSet.byteArray.subarray(dataOffset, dataOffset + length)).buffer);
}

function errorsOf(file: Buffer): string[] {
  const path = join(folder, 'derived.dcm');
  writeFileSync(path, file);
  const lines = dciodvfy(path);
  // The validator names the kind of object that it found; without that it looked at nothing.
  expect(lines.some((line) => /^(MRImage|SCImage)$/.test(line))).toBe(true);
  return lines.filter((line) => line.startsWith('Error'));
}

describe('a derived object', () => {
  const ghosts = simulatedOn(headFile(), withCauses(['periodic-motion', { frequency: 0.3 }]));
  const file = derived(ghosts);
  const dataSet = dicomParser.parseDicom(file);

  it('is valid MR Image Storage: dciodvfy finds no error', () => {
    expect(errorsOf(file)).toEqual([]);
    expect(dataSet.string('x00080016')).toBe('1.2.840.10008.5.1.4.1.1.4');
  });

  it('and the validator does find errors where there are some', () => {
    const withoutOrientation = Buffer.from(file);
    withoutOrientation.writeUInt16LE(0x0039, file.indexOf(Buffer.from([0x20, 0x00, 0x37, 0x00])) + 2);
    expect(errorsOf(withoutOrientation).join()).toContain('ImageOrientationPatient');
  });

  it('without a place in the header is a valid Secondary Capture, with no place made up', () => {
    const nowhere = { ...ghosts, about: { ...ghosts.about, sourcePositionMm: null } };
    const captured = derived(nowhere);
    expect(errorsOf(captured)).toEqual([]);
    const parsed = dicomParser.parseDicom(captured);
    expect([parsed.string('x00080016'), parsed.string('x00200032')]).toEqual(['1.2.840.10008.5.1.4.1.1.7', undefined]);
  });

  it('says that it is derived, simulated, for research, and of whom identity was removed how', () => {
    expect(dataSet.string('x00080008')).toBe('DERIVED\\SECONDARY\\OTHER');
    expect(dataSet.string('x00189004')).toBe('RESEARCH');
    expect(dataSet.string('x00280301')).toBe('NO');
    expect(dataSet.string('x00120062')).toBe('YES');
    expect(dataSet.string('x00120063')).toContain('allow-list');
    expect(dataSet.string('x00280303')).toBe('MODIFIED');
    const codes = dataSet.elements.x00120064?.items?.map((item) => item.dataSet?.string('x00080100'));
    expect(codes).toEqual(['113100', '113105', '113107', '113109']);
    expect(dataSet.string('x00082111')).toMatch(
      /^SIMULATED, NOT FOR DIAGNOSIS\. .*Periodic motion: .*0\.3 Hz.*Reconstruction: .*Seed 1\.$/,
    );
  });

  it('has the case’s number where a patient would be, and no date; only the time of day', () => {
    expect(dataSet.string('x00100010')).toBe('SIMULATED^CASE 42');
    expect(dataSet.string('x00100020')).toBe('CASE-42');
    for (const tag of ['x00100030', 'x00100040', 'x00080020', 'x00080050', 'x00200010']) expect(dataSet.string(tag)).toBeUndefined();
    expect(dataSet.string('x00080032')).toBe('143415');
  });

  it('keeps within 1024 characters of description, whatever the recipe', () => {
    const every = withCauses(...causes.map(({ id }): [string, Record<string, number>] => [id, {}]));
    const parsed = dicomParser.parseDicom(derived(simulatedOn(headFile(), every)));
    const text = Buffer.from(parsed.string('x00082111') ?? '', 'latin1').toString('utf8');
    expect(text.length).toBeLessThanOrEqual(1024);
    expect(text.length).toBeGreaterThan(1000);
    expect(text.startsWith(exportedWords)).toBe(true);
  });
});

describe('the pixels', () => {
  it('are the values of the simulation to half a slope, but for the strip with the words', () => {
    const ghosts = simulatedOn(headFile(), withCauses(['periodic-motion', { frequency: 0.3 }]));
    const dataSet = dicomParser.parseDicom(derived(ghosts));
    const [slope = NaN] = numbers(dataSet, 'x00281053');
    const { values, rows, columns } = ghosts.simulation.image;
    const pixels = pixelsOf(dataSet);
    const strip = marked({ width: columns, height: rows, levels: pixels.slice() }, 1).stripHeight;
    expect(strip).toBe(11);
    const worst = pixels
      .slice(0, columns * (rows - strip))
      .reduce((most, level, i) => Math.max(most, Math.abs(slope * level - (values[i] ?? NaN))), 0);
    // Rounding to the nearest level; a little more for the product in float64.
    expect(worst).toBeLessThanOrEqual((slope / 2) * (1 + 1e-9));
    // The largest value takes the largest level, or almost.
    expect(Math.max(...values) / slope).toBeGreaterThan(65_534);
  });

  it('of whole numbers are these numbers', () => {
    const whole = simulatedOn(headFile(), plain);
    const values = whole.simulation.image.values.map(Math.round);
    const file = derived({ ...whole, simulation: { ...whole.simulation, image: { ...whole.simulation.image, values } } });
    const dataSet = dicomParser.parseDicom(file);
    expect(numbers(dataSet, 'x00281053')).toEqual([1]);
    expect(pixelsOf(dataSet).slice(0, 240 * 256)).toEqual(Uint16Array.from(values.slice(0, 240 * 256)));
  });

  it('of an image too small for the words are each made several, in the same place', () => {
    const placed = { imagePosition: [10, 20, 30] };
    const small = derived(simulatedOn(discFile({ attributes: placed }), plain));
    expect(errorsOf(small)).toEqual([]);
    const dataSet = dicomParser.parseDicom(small);
    // 32 columns of 2 mm; DIAGNOSIS and SIMULATED, need 60 dots and a margin of 2 on both sides.
    expect([dataSet.uint16('x00280010'), dataSet.uint16('x00280011')]).toEqual([64, 64]);
    expect(numbers(dataSet, 'x00280030')).toEqual([1, 1]);
    // The centre of the first pixel of 1 mm lies half a millimetre before that of the first of 2 mm, along both axes.
    expect(numbers(dataSet, 'x00200032')).toEqual([9.5, 19.5, 30]);
  });
});

it('a smaller field of view lies where it was cut out', () => {
  const oblique = {
    imagePosition: [-50, 20, 30],
    imageOrientation: [0, 1, 0, 0, 0, -1],
    pixelSpacing: [1, 2],
    phaseEncodingDirection: 'ROW',
  };
  const source = discFile({ rows: 128, columns: 128, attributes: oblique });
  const dataSet = dicomParser.parseDicom(derived(simulatedOn(source, withCauses(['field-of-view-reduction', { fraction: 0.75 }]))));
  // 96 of 128 columns of 2 mm: the first one kept is column 16, 32 mm along the row, which points to the patient's back (y).
  expect([dataSet.uint16('x00280010'), dataSet.uint16('x00280011')]).toEqual([128, 96]);
  expect(numbers(dataSet, 'x00200032')).toEqual([-50, 52, 30]);
});
