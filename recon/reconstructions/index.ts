/** Every reconstruction, the plainest first. */
import type { Reconstruction } from '../cause';
import { homodyne } from './homodyne';
import { zeroFilled } from './zero-filled';

export const reconstructions: readonly Reconstruction[] = [zeroFilled, homodyne];
