/**
 * Field strength and imaging frequency. The strength in a header is nominal ('3' at 123.25 MHz, which is 2.895 T), and old files
 * give it in gauss: 15000. Frequencies for shifts in hertz come from the imaging frequency, never from the strength.
 */
import type { Header } from '../header';
import { absent, doubtful, fromHeader, quantity, workedOut, type Fact } from './fact';

/** Proton gyromagnetic ratio over 2π, MHz per tesla. CODATA 2018: 42.577 478 518. */
const protonMHzPerTesla = 42.577478518;
const gaussPerTesla = 10_000;
/** No magnet is stronger in tesla; a larger number is gauss. */
const strongestTesla = 50;
/** Nominal strengths differ from the true ones by a few per cent (3.5 % in the example above); more is a contradiction. */
const nominalTolerance = 0.1;
/** Less than this is not worth a word. */
const roundingTolerance = 0.01;

export function imagingFrequencyFact(header: Header): Fact<number> {
  return quantity(header, ['imagingFrequency', 'transmitterFrequency'], { from: 0.05, to: 1000, unit: 'MHz' });
}

export function fieldStrengthFact(header: Header): Fact<number> {
  const written = writtenStrength(header);
  const implied = impliedStrength(header);
  if (implied === undefined || (written.value === null && written.origin === 'doubtful')) return written;
  const frequency = `the imaging frequency implies ${implied.toFixed(3)} T`;
  if (written.value === null) return workedOut(Number(implied.toFixed(3)), `The header gives no field strength; ${frequency}.`);
  const difference = Math.abs(written.value / implied - 1);
  if (difference > nominalTolerance) return doubtful(written.value, `This does not fit: ${frequency} for protons.`);
  if (difference < roundingTolerance) return written;
  return { ...written, note: [written.note, `Nominal: ${frequency}.`].filter((note) => note !== undefined).join(' ') };
}

function writtenStrength(header: Header): Fact<number> {
  const value = header.numbers('fieldStrength')[0];
  if (value === undefined) return absent();
  if (value > strongestTesla && value <= strongestTesla * gaussPerTesla) {
    return workedOut(value / gaussPerTesla, `The header says ${value}, which is gauss; divided by 10 000.`);
  }
  if (value > 0 && value <= strongestTesla) return fromHeader(value);
  return doubtful<number>(null, 'The header’s value is no field strength.');
}

/** Field strength in tesla from the proton frequency; undefined for another nucleus. */
function impliedStrength(header: Header): number | undefined {
  const nucleus = header.text('imagedNucleus') ?? header.text('resonantNucleus') ?? '1H';
  const frequency = imagingFrequencyFact(header).value;
  return frequency !== null && /^(1H|H1|H)$/.test(nucleus) ? frequency / protonMHzPerTesla : undefined;
}
