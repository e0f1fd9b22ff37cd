/** A fact with where it came from. What is not plausible is not repeated: its note says what was wrong, and the value is null. */
import type { AttributeName } from '../allow-list';
import type { Header } from '../header';

export interface Fact<Value> {
  readonly value: Value | null;
  readonly origin: 'header' | 'worked-out' | 'doubtful' | 'absent';
  readonly note?: string;
}

const noted = <Value>(value: Value | null, origin: Fact<Value>['origin'], note?: string): Fact<Value> =>
  note === undefined ? { value, origin } : { value, origin, note };

export const fromHeader = <Value>(value: Value, note?: string): Fact<Value> => noted(value, 'header', note);
export const workedOut = <Value>(value: Value, note: string): Fact<Value> => noted(value, 'worked-out', note);
export const doubtful = <Value>(value: Value | null, note: string): Fact<Value> => noted(value, 'doubtful', note);
export const absent = <Value>(note?: string): Fact<Value> => noted<Value>(null, 'absent', note);

/** What a quantity may be: in its unit, both ends included. */
export interface Plausible {
  readonly from: number;
  readonly to: number;
  readonly unit: string;
}

/** The first value of the first of these attributes that has one: enhanced files have tags of their own for some facts. */
const firstNumber = (header: Header, names: readonly AttributeName[]): number | undefined =>
  names.map((name) => header.numbers(name)[0]).find((value) => value !== undefined);

type Names = readonly [AttributeName, ...AttributeName[]];

/** A number as it stands in the header, if it is one and within what is plausible. */
export function quantity(header: Header, names: AttributeName | Names, { from, to, unit }: Plausible): Fact<number> {
  const first = firstNumber(header, typeof names === 'string' ? [names] : names);
  if (first === undefined) return absent();
  if (first >= from && first <= to) return fromHeader(first);
  return doubtful<number>(null, `The header’s value is not between ${from} and ${to} ${unit}`.trimEnd() + '.');
}

/** As `quantity`, for attributes into which scanners write 0 when they mean none. */
export function quantityOrNone(header: Header, names: AttributeName | Names, plausible: Plausible): Fact<number> {
  const first = firstNumber(header, typeof names === 'string' ? [names] : names);
  return first === 0 ? absent('Written as 0, which stands for none.') : quantity(header, names, plausible);
}
