/** Every reconstruction, the plainest first. */
import type { Reconstruction } from '../cause';
import { homodyne } from './homodyne';
import { interpolated } from './interpolated';
import { pocs } from './pocs';
import { windowed } from './windowed';
import { zeroFilled } from './zero-filled';

export const reconstructions: readonly Reconstruction[] = [zeroFilled, interpolated, windowed, homodyne, pocs];
