/**
 * Bytes of a connection to whole protocol data units: type, reserved byte, length, content (DICOM PS3.8 section 9.3.1). The length stands
 * before the content, so one that is too large is refused before a byte of it is kept; and a unit that has no place where it
 * comes is refused before anything reads it.
 */

export const pduTypes = { associate: 1, data: 4, release: 5, abort: 7 } as const;

/** The most that we say we take in one unit (PS3.8 annex D.1). A sender that keeps to it never meets the limit. */
export const longestData = 256 * 1024;
/** 128 presentation contexts with 30 transfer syntaxes each of 30 bytes are 120 kB. */
const longestAssociate = 128 * 1024;
/** Release and abort are four bytes long. */
const shortest = 4;
const headerLength = 6;

/** What is wrong with a sender's bytes, as the reason of an A-ABORT: PS3.8 table 9-26. */
export const violations = { unrecognised: 1, unexpected: 2, invalid: 6 } as const;
export type Violation = keyof typeof violations;

export class PduFrames {
  private chunks: Buffer[] = [];
  private held = 0;
  private wanted = headerLength;
  private associated = false;

  add(chunk: Buffer): void {
    this.chunks.push(chunk);
    this.held += chunk.length;
  }

  /** The next whole unit; undefined while it has not come. A violation is final. */
  next(): Buffer | Violation | undefined {
    if (this.held < headerLength) return undefined;
    if (this.wanted === headerLength) {
      const header = this.peek(headerLength);
      const violation = this.violationOf(header);
      if (violation !== undefined) return violation;
      this.wanted = headerLength + header.readUInt32BE(2);
    }
    return this.held < this.wanted ? undefined : this.take();
  }

  private violationOf(header: Buffer): Violation | undefined {
    const type = header.readUInt8(0);
    if (type < 1 || type > 7) return 'unrecognised';
    const isFirst = type === pduTypes.associate;
    const isLater = type === pduTypes.data || type === pduTypes.release || type === pduTypes.abort;
    if (this.associated ? !isLater : !isFirst && type !== pduTypes.abort) return 'unexpected';
    const longest = isFirst ? longestAssociate : type === pduTypes.data ? longestData : shortest;
    const length = header.readUInt32BE(2);
    return length < shortest || length > longest ? 'invalid' : undefined;
  }

  private take(): Buffer {
    const all = this.together();
    const unit = all.subarray(0, this.wanted);
    const rest = all.subarray(this.wanted);
    this.chunks = rest.length > 0 ? [rest] : [];
    this.held = rest.length;
    this.wanted = headerLength;
    if (unit[0] === pduTypes.associate) this.associated = true;
    return unit;
  }

  private peek(length: number): Buffer {
    const [first] = this.chunks;
    return first !== undefined && first.length >= length ? first : this.together();
  }

  private together(): Buffer {
    const all = this.chunks.length === 1 && this.chunks[0] !== undefined ? this.chunks[0] : Buffer.concat(this.chunks, this.held);
    this.chunks = [all];
    return all;
  }
}
