/**
 * The protocols of the demo department. One record says how a picture is taken: the phantom is scanned with it, and the header is
 * written from it, so that the scan facts of a demo picture are those that it was made with. Times: common practice.
 */
import type { PhaseEncode } from '../../recon/acquisition';
import { abdomenPhantom } from '../../recon/phantoms/abdomen';
import { headPhantom } from '../../recon/phantoms/head';
import type { FieldStrength } from '../../recon/phantoms/material';
import type { Phantom, Scan } from '../../recon/phantoms/phantom';
import { resolutionPhantom } from '../../recon/phantoms/resolution';
import { vialPhantom } from '../../recon/phantoms/vials';
import { fromDegrees, fromMilliseconds } from '../../recon/units';
import type { Attributes } from '../dicom/write';
import { heron, tern } from './department';

export interface Protocol {
  /** As it stands on a case. */
  readonly name: string;
  readonly bodyRegion: string;
  readonly phantom: Phantom;
  readonly scanner: typeof tern | typeof heron;
  /** One of the scanner's. */
  readonly coil: string;
  /** Fast spin echo is a spin echo with an echo train: its contrast is that of the effective echo time. */
  readonly sequence: 'spin-echo' | 'gradient-echo' | 'echo-planar';
  readonly repetitionTimeMs: number;
  readonly echoTimeMs: number;
  readonly flipAngleDegrees: number;
  readonly averages: number;
  readonly echoTrainLength: number;
  readonly bandwidthPerPixelHz: number;
  readonly sliceThicknessMm: number;
  readonly phaseEncode: PhaseEncode;
  readonly matrix: number;
  readonly isFatSaturated?: boolean;
  /** Per cent of the field of view that is covered along the phase encoding, where it is less than all. */
  readonly percentPhaseFieldOfView?: number;
  /** Per cent of the lines of the picture that are acquired, where it is less than all. */
  readonly percentSampling?: number;
}

const head = { bodyRegion: 'Head', phantom: headPhantom, matrix: 256, averages: 1, sliceThicknessMm: 4 } as const;
const abdomen = { bodyRegion: 'Abdomen', phantom: abdomenPhantom, matrix: 256, averages: 1, sliceThicknessMm: 6 } as const;
const onTern = { scanner: tern } as const;
const onHeron = { scanner: heron } as const;

const spinEchoT1 = { sequence: 'spin-echo', repetitionTimeMs: 500, echoTimeMs: 12, flipAngleDegrees: 90, echoTrainLength: 1 } as const;
const fastSpinEchoT2 = {
  sequence: 'spin-echo',
  repetitionTimeMs: 3800,
  echoTimeMs: 96,
  flipAngleDegrees: 150,
  echoTrainLength: 15,
} as const;

export const headT1: Protocol = {
  ...{ ...head, ...onTern, ...spinEchoT1, name: 'T1 axial, spin echo', coil: 'Head 20' },
  ...{ bandwidthPerPixelHz: 220, phaseEncode: 'column' },
};

export const headT1At15: Protocol = { ...headT1, ...onHeron, coil: 'Head 16', bandwidthPerPixelHz: 130, phaseEncode: 'row' };

export const headT2: Protocol = {
  ...{ ...head, ...onHeron, ...fastSpinEchoT2, name: 'T2 axial, fast spin echo', coil: 'Head 16' },
  ...{ bandwidthPerPixelHz: 190, phaseEncode: 'row', averages: 2, sliceThicknessMm: 5 },
};

export const headEpi: Protocol = {
  ...{ ...head, ...onTern, name: 'Functional EPI, gradient echo', coil: 'Head 20', sequence: 'echo-planar', matrix: 128 },
  ...{ repetitionTimeMs: 2500, echoTimeMs: 30, flipAngleDegrees: 80, echoTrainLength: 128 },
  ...{ bandwidthPerPixelHz: 1860, phaseEncode: 'column', sliceThicknessMm: 3 },
};

/** In phase at 1.5 T. */
export const liverT1: Protocol = {
  ...{ ...abdomen, ...onHeron, name: 'T1 axial, gradient echo, breath-hold', coil: 'Body 18', sequence: 'gradient-echo' },
  ...{ repetitionTimeMs: 150, echoTimeMs: 4.5, flipAngleDegrees: 70, echoTrainLength: 1 },
  ...{ bandwidthPerPixelHz: 260, phaseEncode: 'column' },
};

export const abdomenT2: Protocol = {
  ...{ ...abdomen, ...onTern, ...fastSpinEchoT2, name: 'T2 axial, fast spin echo, triggered', coil: 'Body 30' },
  ...{ repetitionTimeMs: 3200, echoTimeMs: 84, bandwidthPerPixelHz: 300, phaseEncode: 'column' },
};

export const abdomenProtonDensity: Protocol = {
  ...{ ...abdomen, ...onHeron, ...fastSpinEchoT2, name: 'Proton density axial, fast spin echo', coil: 'Body 18' },
  ...{ repetitionTimeMs: 2600, echoTimeMs: 14, echoTrainLength: 7, bandwidthPerPixelHz: 220, phaseEncode: 'column' },
};

/** In phase at 3 T. */
export const abdomenT1At3: Protocol = {
  ...{ ...abdomen, ...onTern, name: 'T1 axial, gradient echo', coil: 'Body 30', sequence: 'gradient-echo' },
  ...{ repetitionTimeMs: 160, echoTimeMs: 2.2, flipAngleDegrees: 65, echoTrainLength: 1 },
  ...{ bandwidthPerPixelHz: 520, phaseEncode: 'column' },
};

export const abdomenT1FatSaturated: Protocol = { ...abdomenT1At3, name: 'T1 axial, gradient echo, fat saturation', isFatSaturated: true };

export const abdomenT1SpinEcho: Protocol = {
  ...{ ...abdomen, ...onHeron, ...spinEchoT1, name: 'T1 axial, spin echo', coil: 'Body 18' },
  ...{ bandwidthPerPixelHz: 150, phaseEncode: 'column' },
};

const quality = { bodyRegion: 'Phantom', matrix: 256, averages: 1, sliceThicknessMm: 5 } as const;

export const discT1: Protocol = {
  ...{ ...quality, ...onHeron, ...spinEchoT1, phantom: resolutionPhantom, name: 'Quality assurance, disc, spin echo', coil: 'Head 16' },
  ...{ echoTimeMs: 20, bandwidthPerPixelHz: 150, phaseEncode: 'row' },
};

export const discT1At3: Protocol = { ...discT1, ...onTern, coil: 'Head 20', bandwidthPerPixelHz: 300, phaseEncode: 'column' };

export const vialsT2: Protocol = {
  ...{ ...quality, ...onHeron, ...fastSpinEchoT2, phantom: vialPhantom, name: 'Quality assurance, vials, fast spin echo', coil: 'Head 16' },
  ...{ repetitionTimeMs: 3000, echoTimeMs: 80, echoTrainLength: 8, bandwidthPerPixelHz: 190, phaseEncode: 'column' },
};

/** How the phantom is scanned. */
export function scanOf({ sequence, repetitionTimeMs, echoTimeMs, flipAngleDegrees, scanner }: Protocol): Scan {
  const times = { repetitionTime: fromMilliseconds(repetitionTimeMs), echoTime: fromMilliseconds(echoTimeMs) };
  const fieldStrength: FieldStrength = scanner.fieldStrengthTesla;
  if (sequence === 'spin-echo') return { sequence: { kind: 'spin-echo', ...times }, fieldStrength };
  return { sequence: { kind: 'spoiled-gradient-echo', ...times, flipAngle: fromDegrees(flipAngleDegrees) }, fieldStrength };
}

const scanningSequences = { 'spin-echo': ['SE'], 'gradient-echo': ['GR'], 'echo-planar': ['EP', 'GR'] } as const;

/** What the header says of it, but for what hangs on the picture's own size. */
export function headerOf(protocol: Protocol): Attributes {
  const { scanner, phantom, percentPhaseFieldOfView, percentSampling } = protocol;
  const edge = -500 * phantom.fieldOfView;
  return {
    imageOrientation: [1, 0, 0, 0, 1, 0],
    imagePosition: [edge, edge, 12.5],
    patientPosition: 'HFS',
    acquisitionType: '2D',
    bodyPart: protocol.bodyRegion.toUpperCase(),
    manufacturer: scanner.manufacturer,
    model: scanner.model,
    softwareVersions: scanner.softwareVersion,
    fieldStrength: scanner.fieldStrengthTesla,
    imagingFrequency: scanner.imagingFrequencyMHz,
    receiveCoil: protocol.coil,
    scanningSequence: [...scanningSequences[protocol.sequence]],
    sequenceVariant: protocol.sequence === 'gradient-echo' ? 'SP' : 'SK',
    ...(protocol.isFatSaturated ? { scanOptions: 'FS' } : {}),
    repetitionTime: protocol.repetitionTimeMs,
    echoTime: protocol.echoTimeMs,
    flipAngle: protocol.flipAngleDegrees,
    averages: protocol.averages,
    echoTrainLength: protocol.echoTrainLength,
    pixelBandwidth: protocol.bandwidthPerPixelHz,
    sliceThickness: protocol.sliceThicknessMm,
    ...(percentPhaseFieldOfView === undefined ? {} : { percentPhaseFieldOfView }),
    ...(percentSampling === undefined ? {} : { percentSampling }),
  };
}
