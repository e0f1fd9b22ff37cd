/** Real files of scanners, read beside daikon, an independent reader: facts against its elements, pixels against its decoding. */
import { Series, type Image } from 'daikon';
import { accepted, refused } from './made-image';
import { headSlices, realFile } from './real-files';

function readByDaikon(bytes: Uint8Array): Image {
  const image = Series.parseImage(new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength));
  if (image === null) throw new Error('daikon does not read this file');
  return image;
}

/** Stored values are integers and neither file rescales them: not one may differ. */
function expectSamePixels(bytes: Uint8Array): void {
  const { values } = accepted(bytes);
  const expected = readByDaikon(bytes).getInterpretedData(false, false);
  expect(values).toHaveLength(expected.length);
  expect(values.findIndex((value, index) => value !== expected[index])).toBe(-1);
}

describe('the twenty head slices', () => {
  test.each(headSlices)('%s reads as a fast spin echo of 1.5 T with phase encoded left to right', (name) => {
    const { rows, columns, spacingMm, facts } = accepted(realFile(name));
    expect({ rows, columns, spacingMm }).toEqual({ rows: 256, columns: 256, spacingMm: [0.859375, 0.859375] });
    expect(facts.phaseEncode).toEqual({ value: 'row', origin: 'header' });
    expect(facts.repetitionTimeMs.value).toBe(2300);
    expect(facts.echoTimeMs.value).toBe(22);
    expect(facts.echoTrainLength.value).toBe(8);
    expect(facts.averages.value).toBe(1);
    expect(facts.fieldStrengthTesla.value).toBe(1.5);
    expect(facts.acquiredReadout.value).toBe(256);
    expect(facts.echoPlanar.value).toBe(false);
  });

  test.each(headSlices)('%s has the numbers that daikon finds under their tags', (name) => {
    const image = readByDaikon(realFile(name));
    const numbersAt = (group: number, element: number) => image.getTag(group, element)?.value?.map(Number);
    const { facts } = accepted(realFile(name));
    expect(facts.imagePositionMm.value).toEqual(numbersAt(0x0020, 0x0032));
    expect(facts.imageOrientation.value).toEqual(numbersAt(0x0020, 0x0037));
    expect([facts.imagingFrequencyMHz.value]).toEqual(numbersAt(0x0018, 0x0084));
    expect([facts.sliceThicknessMm.value]).toEqual(numbersAt(0x0018, 0x0050));
    expect([facts.instanceNumber.value]).toEqual(numbersAt(0x0020, 0x0013));
    expect([0, facts.acquiredReadout.value, facts.acquiredPhase.value, 0]).toEqual(numbersAt(0x0018, 0x1310));
  });

  test.each(headSlices)('%s gives the pixels that daikon decodes', (name) => expectSamePixels(realFile(name)));

  test('the bandwidth of 31.25 is doubtful, and its note says what it would be per pixel', () => {
    const { facts, warnings } = accepted(realFile('volume/brain_010.dcm'));
    expect(facts.bandwidthPerPixelHz).toMatchObject({ value: 31.25, origin: 'doubtful' });
    // 2 · 31 250 Hz over 256 samples.
    expect(facts.bandwidthPerPixelHz.note).toContain('244.14 Hz per pixel');
    expect(warnings.map(({ code }) => code)).toContain('bandwidth-doubtful');
  });

  test('the 2.4 MB of zeros behind the pixels of the first slice are no elements', () => {
    const { deidentification } = accepted(realFile('volume/brain_001.dcm'));
    expect(deidentification.removed).not.toContain('0000,0000');
    expect(deidentification.removed).toContain('0010,0010');
  });

  test('blanked air is warned of', () => {
    const { values, warnings } = accepted(realFile('volume/brain_010.dcm'));
    const zeros = values.filter((value) => value === 0).length / values.length;
    expect(zeros).toBeGreaterThan(0.1);
    expect(warnings.find(({ code }) => code === 'air-blanked')?.text).toContain(`${Math.round(100 * zeros)} %`);
  });
});

describe('an implicit little endian file with traps in its header', () => {
  const bytes = realFile('implicit_little.dcm');

  test('gives the pixels that daikon decodes', () => expectSamePixels(bytes));

  test('15000 gauss are 1.5 T, worked out', () => {
    expect(accepted(bytes).facts.fieldStrengthTesla).toMatchObject({ value: 1.5, origin: 'worked-out' });
  });

  test('an acquisition matrix of 13 values is not used, and the phase encoding direction stands alone', () => {
    const { facts } = accepted(bytes);
    expect(facts.acquiredPhase).toMatchObject({ value: null, origin: 'doubtful' });
    expect(facts.acquiredPhase.note).toContain('13 values');
    expect(facts.phaseEncode).toMatchObject({ value: 'column', origin: 'header' });
    expect(facts.phaseEncode.note).toContain('does not confirm');
  });

  test('an echo train of 0 is doubtful', () => {
    expect(accepted(bytes).facts.echoTrainLength).toMatchObject({ value: 0, origin: 'doubtful' });
  });

  test('a direction that no matrix confirms, and times of the sequence, are read all the same', () => {
    const { facts } = accepted(bytes);
    expect([facts.repetitionTimeMs.value, facts.echoTimeMs.value, facts.percentSampling.value]).toEqual([10002, 159.5, 100]);
  });

  test('dates of the old form, with points, are nowhere, and the time with colons is a time of day', () => {
    const image = accepted(bytes);
    expect(image.facts.timeOfDay.value).toBe('09:29:41');
    expect(JSON.stringify({ ...image, values: [] })).not.toContain('1996');
  });
});

describe('an 8-bit cardiac loop of 16 frames in the classic class', () => {
  const bytes = realFile('explicit_little.dcm');
  const image = accepted(bytes);

  test('gives the pixels that daikon decodes, frame by frame', () => {
    expect([image.frames, image.rows, image.columns]).toEqual([16, 256, 256]);
    const { values } = image;
    const daikon = readByDaikon(bytes);
    for (const frame of [0, 7, 15]) {
      const expected = daikon.getInterpretedData(false, false, frame);
      const own = values.subarray(frame * 65_536, (frame + 1) * 65_536);
      expect(own.findIndex((value, index) => value !== expected[index])).toBe(-1);
    }
  });

  test('delays its frames by the frame time of its header', () => {
    const step = Number(readByDaikon(bytes).getTag(0x0018, 0x1063)?.value?.[0]);
    expect(image.frameFacts.map(({ triggerDelayMs }) => triggerDelayMs)).toEqual(
      Array.from({ length: 16 }, (_, frame) => expect.closeTo(frame * step, 6)),
    );
  });

  test('says neither axis, spacing nor place, so that none is made up', () => {
    expect(image.facts.phaseEncode).toMatchObject({ value: null, origin: 'absent' });
    expect(image.spacingMm).toBeNull();
    expect(image.frameFacts.every(({ positionMm }) => positionMm === null)).toBe(true);
    expect(image.warnings.map(({ code }) => code)).toEqual(expect.arrayContaining(['phase-encode-unknown', 'spacing-missing']));
  });

  test('dates of the old form, with points, are nowhere', () => {
    expect(Buffer.from(bytes).includes('1995.06.26')).toBe(true);
    expect(JSON.stringify({ ...image, values: [] })).not.toContain('1995');
  });
});

test('an explicit big endian file gives the pixels that daikon decodes', () => expectSamePixels(realFile('explicit_big.dcm')));

test.each([
  ['jpeg_ls.dcm', 'transfer-syntax', 'near-lossless JPEG-LS'],
  ['jpeg_2000.dcm', 'not-mr', 'CT'],
  ['rle.dcm', 'not-mr', 'CT'],
  ['jpeg_lossless_sel1.dcm', 'not-mr', 'CT'],
  ['jpeg_baseline_8bit.dcm', 'not-mr', 'XA'],
])('%s is refused as %s, and the reason says %s', (name, code, words) => {
  const refusal = refused(realFile(name));
  expect(refusal.code).toBe(code);
  expect(refusal.reason).toContain(words);
});
