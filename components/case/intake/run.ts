/** One run of sending: whether it is paused or cancelled, and how it waits after a lost connection. */
import { upload } from '@/components/api/images';
import { findSent } from '@/components/api/series';
import type { Line } from './send-series';

/** Milliseconds between attempts: soon at first, then patiently. */
const firstWait = 1000;
const longestWait = 15_000;

export class Run {
  private readonly gone = new AbortController();
  private resumed: { readonly promise: Promise<void>; readonly resolve: () => void } | null = null;

  get isCancelled(): boolean {
    return this.gone.signal.aborted;
  }

  /** What is under way is finished: a batch is small. */
  pause(): void {
    let resolve = (): void => undefined;
    const promise = new Promise<void>((settle) => (resolve = settle));
    this.resumed ??= { promise, resolve };
  }

  resume(): void {
    this.resumed?.resolve();
    this.resumed = null;
  }

  cancel(): void {
    this.gone.abort();
    this.resume();
  }

  readonly line: Line = {
    send: (files, onProgress) => upload(files, onProgress, this.gone.signal),
    findSent,
    // Without a secure context there is no `subtle`, whatever the types say.
    digest: window.isSecureContext ? digestOf : undefined,
    untilRetry: (attempt) => this.untilRetry(attempt),
    untilWanted: async () => {
      await this.resumed?.promise;
      this.gone.signal.throwIfAborted();
    },
  };

  /** A while, or until the browser says that the network is back, or nobody wants it any more. */
  private untilRetry(attempt: number): Promise<void> {
    return new Promise((resolve) => {
      const done = (): void => {
        clearTimeout(timer);
        window.removeEventListener('online', done);
        this.gone.signal.removeEventListener('abort', done);
        resolve();
      };
      const timer = setTimeout(done, Math.min(longestWait, firstWait * 2 ** attempt));
      window.addEventListener('online', done);
      this.gone.signal.addEventListener('abort', done);
    });
  }
}

/** SHA-256 in hexadecimal. */
async function digestOf(file: Blob): Promise<string> {
  const digest = await crypto.subtle.digest('SHA-256', await file.arrayBuffer());
  return [...new Uint8Array(digest)].map((byte) => byte.toString(16).padStart(2, '0')).join('');
}
