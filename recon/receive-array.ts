/**
 * The elements of a ring of coils.ts with their phases, in the directions of the encoding:
 *   C_j(p, q) = exp(−|r − r_j|²/2w²)·exp(i(φ_j + 2πc·r·n_j)),
 * p along the phase encoding, q along the readout, both from the centre in parts of the longer side of the field of view; n_j points from
 * the centre to element j, at the angle φ_j from the phase-encode axis towards the readout. A Gaussian times a linear phase is the product
 * of a factor along each direction. c = ½ turn over the field of view, and the ring itself, are common practice in simulation.
 *
 * What unfolding works with is S_j = C_j/√Σ|C|²: the picture is what these elements give together when every line is taken.
 */
import type { CoilRing } from './coils';
import type { ComplexArray } from './unfolding';
import { complexArray } from './unfolding';

const turnsAcross = 0.5;

/** The factors of all elements at the places that they were made for, [place, element]. */
export interface Elements {
  readonly nElements: number;
  readonly alongPhaseEncode: ComplexArray;
  readonly alongReadout: ComplexArray;
}

/** Where an element lies along one direction, and its phase, start + turn·x. */
interface Along {
  readonly centre: number;
  readonly start: number;
  readonly turn: number;
}

/** exp(−(x − centre)²/2w²)·exp(i(start + turn·x)) of every element at each of `places`. */
function factors(places: Float64Array, elements: readonly Along[], width: number): ComplexArray {
  const factor = complexArray(places.length * elements.length);
  places.forEach((x, place) => {
    elements.forEach(({ centre, start, turn }, j) => {
      const size = Math.exp((-(x - centre) * (x - centre)) / (2 * width * width));
      factor.re[place * elements.length + j] = size * Math.cos(start + turn * x);
      factor.im[place * elements.length + j] = size * Math.sin(start + turn * x);
    });
  });
  return factor;
}

/** The elements of `ring` at every pair of a place along the phase encoding and one along the readout. */
export function elementsAt(ring: CoilRing, alongPhaseEncode: Float64Array, alongReadout: Float64Array): Elements {
  const angles = Array.from({ length: ring.elements }, (_, j) => ring.firstAngle + (2 * Math.PI * j) / ring.elements);
  const turn = 2 * Math.PI * turnsAcross;
  const phaseEncode = angles.map((angle) => ({ centre: ring.radius * Math.cos(angle), start: angle, turn: turn * Math.cos(angle) }));
  const readout = angles.map((angle) => ({ centre: ring.radius * Math.sin(angle), start: 0, turn: turn * Math.sin(angle) }));
  return {
    nElements: ring.elements,
    alongPhaseEncode: factors(alongPhaseEncode, phaseEncode, ring.width),
    alongReadout: factors(alongReadout, readout, ring.width),
  };
}

/** S_j of every element at place (p, q) of those that `elements` were made for, into `maps` from index `at` on. */
export function sensitivitiesAt(elements: Elements, p: number, q: number, maps: ComplexArray, at: number): void {
  const { nElements, alongPhaseEncode, alongReadout } = elements;
  let power = 0;
  for (let j = 0; j < nElements; j++) {
    const a = alongPhaseEncode.re[p * nElements + j] as number;
    const b = alongPhaseEncode.im[p * nElements + j] as number;
    const c = alongReadout.re[q * nElements + j] as number;
    const d = alongReadout.im[q * nElements + j] as number;
    const re = a * c - b * d;
    const im = a * d + b * c;
    maps.re[at + j] = re;
    maps.im[at + j] = im;
    power += re * re + im * im;
  }
  const scale = power > 0 ? 1 / Math.sqrt(power) : 0;
  for (let i = at; i < at + nElements; i++) {
    maps.re[i] = (maps.re[i] as number) * scale;
    maps.im[i] = (maps.im[i] as number) * scale;
  }
}
