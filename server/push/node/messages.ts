/**
 * Messages between the server and the thread that speaks DICOM. What a sender calls itself travels only in `knocks`, for the server to look
 * it up; it is neither kept nor logged.
 */

/** The thread's limits and place; what it starts with. */
export interface NodeSettings {
  readonly host: string;
  /** 0 takes a free port. */
  readonly port: number;
  /** The most that one object may have. */
  readonly objectBytes: number;
  /** Objects that are on their way or being read at the same time, of all senders together. */
  readonly objects: number;
  readonly connections: number;
  /** Milliseconds in which a message, or the rest of it, must come. */
  readonly patienceMs: number;
  readonly accepts: { readonly transferSyntaxes: readonly string[] };
}

export type FromNode =
  | { readonly kind: 'listens'; readonly port: number }
  | { readonly kind: 'cannot-listen'; readonly code: string }
  | { readonly kind: 'lives' }
  | { readonly kind: 'knocks'; readonly association: number; readonly calling: string; readonly called: string; readonly address: string }
  /** A whole object as a DICOM file, its buffer handed over; null where it was larger than the limit and not kept. */
  | { readonly kind: 'object'; readonly association: number; readonly bytes: Uint8Array<ArrayBuffer> | null }
  /** The connection is over, whichever way it ended. */
  | { readonly kind: 'leaves'; readonly association: number };

/** Why a sender is not let in. */
export const strangers = ['calling-title', 'called-title', 'address'] as const;
export type Stranger = (typeof strangers)[number];

export type ToNode =
  | { readonly kind: 'admit'; readonly association: number; readonly refused: Stranger | 'not-now' | null }
  | { readonly kind: 'answer'; readonly association: number; readonly status: number; readonly comment: string }
  | { readonly kind: 'live' }
  | { readonly kind: 'close' };
