/**
 * An image as an array of coil elements takes it, one line in R, and as unfolding gives it back (Pruessmann et al., Magn Reson Med
 * 1999;42:952):
 *   a_j = Σ_p S_jp·I_p + √R·σ·n_j,   v = (S'ᴴS')⁻¹S'ᴴ·a,
 * p every pixel of the object that lies on one folded pixel, v its R places inside the field of view, S the sensitivities of the elements and S'
 * the maps. With S' = S the object comes back, with the noise g·√R·σ, which is drawn as such: L⁻ᴴz of unfolding.ts.
 *
 * Lines are rounded up to a multiple of R, as a scanner does; what is shown are the middle ones.
 */
import type { CalibrationNoise } from './calibration-noise';
import { addCalibrationNoise, calibrationNoise } from './calibration-noise';
import type { CoilRing } from './coils';
import type { ComplexPlane } from './grid';
import { centredGrid, complexZeros } from './grid';
import type { Lines } from './lines';
import type { Random } from './random';
import type { Elements } from './receive-array';
import { elementsAt, sensitivitiesAt } from './receive-array';
import type { ComplexArray, Sensitivities } from './unfolding';
import { complexArray, factorise, project, solveLower, solveUpper } from './unfolding';

export interface ParallelImaging {
  readonly accelerationFactor: number;
  /** The field of view along the phase encoding, part of the picture. */
  readonly fraction: number;
  readonly ring: CoilRing;
  /** Metres along the phase encoding by which the maps lie elsewhere than the elements. */
  readonly displacement: number;
  /** Standard deviation of the maps, as a part of all elements together. */
  readonly mapNoise: number;
  /** Standard deviation of each part of the image if every line were taken. */
  readonly noise: number;
}

/** The window of R·nFolded lines begins `first` lines from the centre. */
interface Folding {
  readonly R: number;
  readonly nFolded: number;
  readonly nShown: number;
  readonly first: number;
}

function foldingOf(nLines: number, R: number, fraction: number): Folding {
  const nShown = Math.max(1, Math.round(fraction * nLines));
  const nFolded = Math.ceil(nShown / R);
  return { R, nFolded, nShown, first: -Math.floor((R * nFolded) / 2) };
}

/** The elements at the lines of the object, and the maps of them at the lines of the window. */
interface Seen {
  readonly real: Elements;
  readonly mapped: Elements;
  readonly noise: CalibrationNoise | undefined;
}

function elementsOf(object: ComplexPlane, lines: Lines, folding: Folding, scan: ParallelImaging, random: Random): Seen {
  const { nLines, samplesPerLine, centre, sampleStride } = lines;
  const [phasePixel, readoutPixel] = sampleStride === 1 ? object.spacing : [object.spacing[1], object.spacing[0]];
  const side = Math.max(nLines * phasePixel, samplesPerLine * readoutPixel);
  const nWindow = folding.R * folding.nFolded;
  const centreSample = Math.floor(samplesPerLine / 2);
  const alongReadout = Float64Array.from({ length: samplesPerLine }, (_, sample) => ((sample - centreSample) * readoutPixel) / side);
  const ofObject = Float64Array.from({ length: nLines }, (_, line) => ((line - centre) * phasePixel) / side);
  const ofWindow = Float64Array.from({ length: nWindow }, (_, i) => ((folding.first + i) * phasePixel - scan.displacement) / side);
  const nElements = scan.ring.elements;
  const noiseSize = scan.mapNoise / Math.sqrt(nElements);
  return {
    real: elementsAt(scan.ring, ofObject, alongReadout),
    mapped: elementsAt(scan.ring, ofWindow, alongReadout),
    noise: noiseSize > 0 ? calibrationNoise({ nElements, nLines: nWindow, nSamples: samplesPerLine }, noiseSize, random) : undefined,
  };
}

/** Lines of the object that lie on folded line `folded`. */
function sourcesOf({ nLines, centre }: Lines, { nFolded, first }: Folding, folded: number): number[] {
  return Array.from({ length: nLines }, (_, line) => line).filter((line) => (line - centre - first - folded) % nFolded === 0);
}

/** What each element receives of `sources` at `sample`, Σ_p S_jp·I_p, into `signal`. */
function receive(object: ComplexPlane, lines: Lines, sources: readonly number[], sample: number, real: Elements, buffers: Buffers): void {
  const { seen, signal } = buffers;
  signal.re.fill(0);
  signal.im.fill(0);
  for (const line of sources) {
    const i = line * lines.lineStride + sample * lines.sampleStride;
    const a = object.re[i] as number;
    const b = object.im[i] as number;
    if (a === 0 && b === 0) continue;
    sensitivitiesAt(real, line, sample, seen, 0);
    for (let j = 0; j < real.nElements; j++) {
      const c = seen.re[j] as number;
      const d = seen.im[j] as number;
      signal.re[j] = (signal.re[j] as number) + a * c - b * d;
      signal.im[j] = (signal.im[j] as number) + a * d + b * c;
    }
  }
}

/** Kept from one folded pixel to the next. */
interface Buffers {
  readonly seen: ComplexArray;
  readonly signal: ComplexArray;
  readonly maps: Sensitivities;
  readonly factor: ComplexArray;
  readonly places: ComplexArray;
}

const buffersOf = (nElements: number, nPlaces: number): Buffers => ({
  seen: complexArray(nElements),
  signal: complexArray(nElements),
  maps: { ...complexArray(nElements * nPlaces), nElements, nPlaces },
  factor: complexArray(nPlaces * nPlaces),
  places: complexArray(nPlaces),
});

/** `places` = (S'ᴴS')⁻¹S'ᴴ·signal + L⁻ᴴz, z of standard deviation `noise` in each part. */
function unfold({ signal, maps, factor, places }: Buffers, noise: number, random: Random): void {
  factorise(maps, factor);
  project(maps, signal, places);
  solveLower(factor, maps.nPlaces, places);
  for (let place = 0; place < maps.nPlaces && noise > 0; place++) {
    places.re[place] = (places.re[place] as number) + noise * random.normal();
    places.im[place] = (places.im[place] as number) + noise * random.normal();
  }
  solveUpper(factor, maps.nPlaces, places);
}

/** `object` folded by the array and unfolded by its maps, [row, column]; `lines` those of its grid. */
export function foldedAndUnfolded(object: ComplexPlane, lines: Lines, scan: ParallelImaging, random: Random): ComplexPlane {
  const folding = foldingOf(lines.nLines, scan.accelerationFactor, scan.fraction);
  const { R, nFolded, nShown, first } = folding;
  const elements = elementsOf(object, lines, folding, scan, random);
  const buffers = buffersOf(scan.ring.elements, R);
  const [rows, columns] = lines.sampleStride === 1 ? [nShown, object.columns] : [object.rows, nShown];
  const image = complexZeros(centredGrid(rows, columns, object.spacing));
  const lineStride = lines.sampleStride === 1 ? columns : 1;
  const sampleStride = lines.sampleStride === 1 ? 1 : columns;
  for (let folded = 0; folded < nFolded; folded++) {
    const sources = sourcesOf(lines, folding, folded);
    for (let sample = 0; sample < lines.samplesPerLine; sample++) {
      receive(object, lines, sources, sample, elements.real, buffers);
      for (let place = 0; place < R; place++) {
        const at = place * scan.ring.elements;
        sensitivitiesAt(elements.mapped, folded + place * nFolded, sample, buffers.maps, at);
        if (elements.noise) addCalibrationNoise(elements.noise, folded + place * nFolded, sample, buffers.maps, at);
      }
      unfold(buffers, Math.sqrt(R) * scan.noise, random);
      for (let place = 0; place < R; place++) {
        const line = first + folded + place * nFolded + Math.floor(nShown / 2);
        if (line < 0 || line >= nShown) continue;
        image.re[line * lineStride + sample * sampleStride] = buffers.places.re[place] as number;
        image.im[line * lineStride + sample * sampleStride] = buffers.places.im[place] as number;
      }
    }
  }
  return image;
}
