/** A file that waits to be sent: chosen, dropped, or listed in an archive and unpacked only when its turn comes. */
import type { Refusal } from '@/server/contract/images';

export interface FileToSend {
  readonly name: string;
  readonly size: number;
  /** Its bytes, or why it is not sent. */
  open(): Promise<File | Refusal>;
}

export const isRefusal = (opened: File | Refusal): opened is Refusal => 'code' in opened;

export const fileToSend = (file: File): FileToSend => ({ name: file.name, size: file.size, open: () => Promise.resolve(file) });
