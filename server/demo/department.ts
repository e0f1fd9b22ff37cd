/** The demo department: an invented hospital, one member per role, two scanners with their coils. */
import type { DepartmentSeed } from '../../db/seed';
import type { Role } from '../contract/route';

export const departmentName = 'Alderweir Hospital, MR';

export const people: readonly { readonly name: string; readonly email: string; readonly role: Role }[] = [
  { name: 'Ines Marrable', email: 'ines.marrable@alderweir.example', role: 'technologist' },
  { name: 'Tobias Quill', email: 'tobias.quill@alderweir.example', role: 'lead-technologist' },
  { name: 'Dr Oona Fairweather', email: 'oona.fairweather@alderweir.example', role: 'physicist' },
  { name: 'Piet Lanthorn', email: 'piet.lanthorn@alderweir.example', role: 'administrator' },
];

/** A scanner with what its pictures say of it. */
export const tern = {
  name: 'Tern 3 T',
  manufacturer: 'Saltmarsh Imaging',
  model: 'Tern',
  fieldStrengthTesla: 3,
  imagingFrequencyMHz: 123.2,
  serial: 'TN-30417',
  softwareVersion: '6.2',
  room: 'Room 2',
  coils: [
    { name: 'Head 20', serial: 'H20-1184', elements: 20 },
    { name: 'Body 30', serial: 'B30-2206', elements: 30 },
  ],
} as const;

export const heron = {
  name: 'Heron 1.5 T',
  manufacturer: 'Saltmarsh Imaging',
  model: 'Heron',
  fieldStrengthTesla: 1.5,
  imagingFrequencyMHz: 63.86,
  serial: 'HN-15092',
  softwareVersion: '4.9',
  room: 'Room 1',
  coils: [
    { name: 'Body 18', serial: 'B18-0733', elements: 18 },
    { name: 'Head 16', serial: 'H16-0521', elements: 16 },
  ],
} as const;

export const scanners: DepartmentSeed['scanners'] = [tern, heron].map(({ imagingFrequencyMHz: _frequency, coils, ...scanner }) => ({
  ...scanner,
  coils: coils.map((coil) => ({ ...coil })),
}));
