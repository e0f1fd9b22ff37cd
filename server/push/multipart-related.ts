/**
 * Parts of a multipart/related body (RFC 2387, RFC 2046 section 5.1) as they come, one at a time: the next is read only when the one before has
 * been dealt with, so that the sender is slowed down to the pace of the door. A part over the limit is read to its end and not kept.
 */
import { AppError, invalidAt } from '../errors';

export interface Part {
  /** Lower case, without parameters. */
  readonly mediaType: string | undefined;
  /** Null where the part is larger than the limit. */
  readonly bytes: Buffer | null;
}

interface Limits {
  readonly partBytes: number;
  readonly parts: number;
  readonly totalBytes: number;
}

const longestHead = 8 * 1024;
const lineEnd = Buffer.from('\r\n');
const headEnd = Buffer.from('\r\n\r\n');

/** RFC 2046: 1 to 70 characters. Throws where the type is another, or parts of it are not DICOM. */
export function boundaryOf(contentType: string | undefined): string {
  const parameters = /^multipart\/related\s*;(.*)$/is.exec(contentType ?? '')?.[1];
  if (parameters === undefined) throw notTaken();
  const parameter = (name: string): string | undefined => {
    const found = new RegExp(`(?:^|;)\\s*${name}\\s*=\\s*(?:"([^"]*)"|([^\\s;"]+))`, 'i').exec(parameters);
    return found?.[1] ?? found?.[2];
  };
  if (!/^application\/dicom$/i.test(parameter('type') ?? 'application/dicom')) throw notTaken();
  const boundary = parameter('boundary');
  if (boundary === undefined || !/^[\w'()+,./:=? -]{0,69}[\w'()+,./:=?-]$/.test(boundary))
    throw invalidAt([], 'the multipart boundary is missing');
  return boundary;
}

const notTaken = () =>
  new AppError('unsupported-media-type', { detail: 'Objects are sent as multipart/related; type="application/dicom"' });

/** Reads `body` part by part. */
export async function* partsOf(body: AsyncIterable<Buffer>, boundary: string, limits: Limits): AsyncGenerator<Part> {
  const delimiter = Buffer.from(`\r\n--${boundary}`);
  const sections = new Sections(body, limits);
  // What stands before the first delimiter is no part; the body may begin with the delimiter itself.
  await sections.until(delimiter, 0);
  for (let count = 0; ; count++) {
    if (await sections.startsWith('--')) return;
    if (count === limits.parts) throw tooMuch(`One request may hold ${limits.parts} objects`);
    const head = await sections.until(headEnd, longestHead);
    if (head === null) throw invalidAt([], 'the head of a part is too long');
    const bytes = await sections.until(delimiter, limits.partBytes);
    yield { mediaType: mediaTypeOf(head), bytes };
  }
}

const mediaTypeOf = (head: Buffer): string | undefined =>
  /^content-type:\s*([\w.+/-]+)/im.exec(head.toString('latin1'))?.[1]?.toLowerCase();

const tooMuch = (detail: string) => new AppError('too-large', { detail });

/** A stream of bytes, cut where marks stand. */
class Sections {
  // A delimiter begins with a line end, also at the very start.
  private rest: Buffer = lineEnd;
  private total = 0;
  private readonly source: AsyncIterator<Buffer>;

  constructor(
    body: AsyncIterable<Buffer>,
    private readonly limits: Limits,
  ) {
    this.source = body[Symbol.asyncIterator]();
  }

  /** The bytes up to `mark`, which is passed over; null where they are more than `most`. */
  async until(mark: Buffer, most: number): Promise<Buffer | null> {
    const kept: Buffer[] = [];
    let length = 0;
    const keep = (bytes: Buffer): void => {
      length += bytes.length;
      if (length <= most) kept.push(bytes);
      else kept.length = 0;
    };
    for (;;) {
      const at = this.rest.indexOf(mark);
      if (at >= 0) {
        keep(this.rest.subarray(0, at));
        this.rest = this.rest.subarray(at + mark.length);
        return length <= most ? Buffer.concat(kept, length) : null;
      }
      // The end of what is here may be the beginning of the mark.
      const certain = Math.max(0, this.rest.length - mark.length + 1);
      keep(this.rest.subarray(0, certain));
      this.rest = this.rest.subarray(certain);
      await this.more();
    }
  }

  async startsWith(text: string): Promise<boolean> {
    while (this.rest.length < text.length) await this.more();
    return this.rest.subarray(0, text.length).toString('latin1') === text;
  }

  private async more(): Promise<void> {
    const { value, done } = await this.source.next();
    if (done === true) throw invalidAt([], 'the multipart body ends in the middle of a part');
    this.total += value.length;
    if (this.total > this.limits.totalBytes) throw tooMuch('One request may not hold so much; send the objects in several');
    this.rest = this.rest.length === 0 ? value : Buffer.concat([this.rest, value]);
  }
}
