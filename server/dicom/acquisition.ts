/**
 * Scan facts, in the units of a header, as the acquisition that the models work on, in SI. What is absent or doubtful is left
 * out, so that a model falls back to its own initial value and says so; what a member set counts like the header.
 */
import type { Acquisition } from '../../recon/acquisition';
import { fieldDirectionOf } from '../../recon/field-direction';
import { fromDegrees, fromMegahertz, fromMillimetres, fromMilliseconds, fromPercent } from '../../recon/units';
import type { ScanFacts } from '../contract/facts';

/** An acquisition whose phase encoding axis nobody has told yet. It can be looked at, not simulated. */
export type AcquisitionWithoutAxis = Omit<Acquisition, 'phaseEncode'> & { readonly phaseEncode?: undefined };

type Fact<Value> = { readonly value: Value | null; readonly origin: string };

const known = <Value>({ value, origin }: Fact<Value>): Value | undefined => (value === null || origin === 'doubtful' ? undefined : value);

const converted = (fact: Fact<number>, convert: (value: number) => number): number | undefined => {
  const value = known(fact);
  return value === undefined ? undefined : convert(value);
};

export function acquisitionOf(facts: ScanFacts): Acquisition | AcquisitionWithoutAxis {
  const phaseEncode = known(facts.phaseEncode);
  const scanned = {
    repetitionTime: converted(facts.repetitionTimeMs, fromMilliseconds),
    echoTime: converted(facts.echoTimeMs, fromMilliseconds),
    flipAngle: converted(facts.flipAngleDegrees, fromDegrees),
    echoTrainLength: known(facts.echoTrainLength),
    averages: known(facts.averages),
    imagingFrequency: converted(facts.imagingFrequencyMHz, fromMegahertz),
    fieldStrength: known(facts.fieldStrengthTesla),
    bandwidthPerPixel: known(facts.bandwidthPerPixelHz),
    acquiredPhase: known(facts.acquiredPhase),
    acquiredReadout: known(facts.acquiredReadout),
    phaseFieldOfViewFraction: converted(facts.percentPhaseFieldOfView, fromPercent),
    accelerationFactor: known(facts.accelerationFactor),
    echoPlanar: known(facts.echoPlanar),
    acquisitionType: known(facts.acquisitionType),
    sliceThickness: converted(facts.sliceThicknessMm, fromMillimetres),
    fieldDirection: fieldDirectionOf(known(facts.imageOrientation) ?? [], known(facts.patientPosition) ?? ''),
  };
  const present = Object.fromEntries(Object.entries(scanned).filter(([, value]) => value !== undefined)) as Omit<
    Acquisition,
    'phaseEncode'
  >;
  return phaseEncode === undefined ? present : { ...present, phaseEncode };
}
