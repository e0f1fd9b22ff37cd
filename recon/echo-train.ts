/**
 * Which echo of its train each line is taken with. E echoes fill k-space in E groups of ⌈n/E⌉ lines, one line of every group a train;
 * the groups are bands from one edge to the other (linear, reverse), rings about the centre (centric), or combs of every E-th line
 * (interleaved). n counts the lines that are taken.
 * Orders: Hennig, Nauerth, Friedburg, Magn Reson Med 1986;3:823, doi 10.1002/mrm.1910030602; the names are common practice.
 */
import type { Encoded } from './cause';
import type { Lines } from './lines';
import { takenOrder } from './lines';

export type EchoOrder = 'linear' | 'reverse' | 'centric' | 'interleaved';

/** Echo number from 0 of every line; −1 for lines that are not taken. */
export function echoNumbers(kspace: Encoded, lines: Lines, echoTrainLength: number, order: EchoOrder): Int32Array {
  const numbers = takenOrder(kspace, lines);
  const nTaken = numbers.reduce((count, n) => count + (n >= 0 ? 1 : 0), 0);
  const nTrains = Math.max(1, Math.ceil(nTaken / echoTrainLength));
  if (order === 'interleaved') return numbers.map((n) => (n < 0 ? -1 : n % echoTrainLength));
  if (order === 'linear') return numbers.map((n) => (n < 0 ? -1 : Math.floor(n / nTrains)));
  if (order === 'reverse') return numbers.map((n) => (n < 0 ? -1 : Math.floor((nTaken - 1 - n) / nTrains)));
  const fromCentre = Array.from(numbers.keys())
    .filter((line) => (numbers[line] as number) >= 0)
    .sort((a, b) => Math.abs(a - lines.centre) - Math.abs(b - lines.centre) || a - b);
  fromCentre.forEach((line, rank) => (numbers[line] = Math.floor(rank / nTrains)));
  return numbers;
}
