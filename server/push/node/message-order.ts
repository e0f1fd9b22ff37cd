/**
 * What a sender may say once its association stands: C-ECHO and C-STORE requests, each a command set and, for C-STORE, a data set
 * (DICOM PS3.7 sections 9.3.1, 9.3.5 and annex E; fragments: PS3.8 annex E). Everything else is refused here, before the protocol
 * library unpacks it: it gathers whatever comes in memory, and reads a command set with the reader for files.
 */
import type { Violation } from './pdu-frames';

const headerLength = 6;
const lengthAndHeader = 6;
const commandFlag = 1;
const lastFlag = 2;

/** Command sets of C-ECHO and C-STORE are under 400 bytes: three UIDs, an AE title and five numbers. */
const longestCommand = 4096;
const requests = { store: 0x0001, echo: 0x0030 } as const;
const noDataSet = 0x0101;

/** The elements of group 0000 of the two requests, with the longest value of each. */
const elements: Readonly<Record<number, number>> = {
  0x0000: 4, // group length
  0x0002: 64, // affected SOP class UID
  0x0100: 2, // command field
  0x0110: 2, // message id
  0x0700: 2, // priority
  0x0800: 2, // command data set type
  0x1000: 64, // affected SOP instance UID
  0x1030: 16, // move originator AE title
  0x1031: 2, // move originator message id
};

interface Fragment {
  readonly context: number;
  readonly isCommand: boolean;
  readonly isLast: boolean;
  readonly value: Buffer;
}

export class MessageOrder {
  private command: Buffer[] = [];
  private commandBytes = 0;
  /** The context of the data set that must come next. */
  private awaited: number | undefined;

  /** `contexts`: ids of the presentation contexts that were accepted. */
  constructor(private readonly contexts: ReadonlySet<number>) {}

  /** Looks over a P-DATA-TF unit. */
  check(unit: Buffer): Violation | undefined {
    const fragments = fragmentsOf(unit);
    if (fragments === undefined) return 'invalid';
    for (const fragment of fragments) {
      const violation = this.contexts.has(fragment.context) ? this.place(fragment) : 'invalid';
      if (violation !== undefined) return violation;
    }
    return undefined;
  }

  private place({ context, isCommand, isLast, value }: Fragment): Violation | undefined {
    if (isCommand !== (this.awaited === undefined)) return 'unexpected';
    if (!isCommand) {
      if (context !== this.awaited) return 'unexpected';
      if (isLast) this.awaited = undefined;
      return undefined;
    }
    this.command.push(value);
    this.commandBytes += value.length;
    if (this.commandBytes > longestCommand) return 'invalid';
    return isLast ? this.endCommand(context) : undefined;
  }

  private endCommand(context: number): Violation | undefined {
    const hasDataSet = readCommand(Buffer.concat(this.command));
    this.command = [];
    this.commandBytes = 0;
    if (hasDataSet === undefined) return 'invalid';
    if (hasDataSet) this.awaited = context;
    return undefined;
  }
}

/** The fragments of a unit; undefined where their lengths do not add up. */
function fragmentsOf(unit: Buffer): Fragment[] | undefined {
  const fragments: Fragment[] = [];
  let offset = headerLength;
  while (offset < unit.length) {
    if (offset + lengthAndHeader > unit.length) return undefined;
    const end = offset + 4 + unit.readUInt32BE(offset);
    const flags = unit.readUInt8(offset + 5);
    if (end < offset + lengthAndHeader || end > unit.length || flags > (commandFlag | lastFlag)) return undefined;
    fragments.push({
      context: unit.readUInt8(offset + 4),
      isCommand: (flags & commandFlag) !== 0,
      isLast: (flags & lastFlag) !== 0,
      value: unit.subarray(offset + lengthAndHeader, end),
    });
    offset = end;
  }
  return fragments;
}

/** Whether a data set follows the command; undefined where it is not a whole C-ECHO or C-STORE request. Implicit VR little endian. */
function readCommand(bytes: Buffer): boolean | undefined {
  const numbers = new Map<number, number>();
  let offset = 0;
  let last = -1;
  while (offset < bytes.length) {
    if (offset + 8 > bytes.length || bytes.readUInt16LE(offset) !== 0) return undefined;
    const element = bytes.readUInt16LE(offset + 2);
    const length = bytes.readUInt32LE(offset + 4);
    if (element <= last || length > (elements[element] ?? -1) || offset + 8 + length > bytes.length) return undefined;
    if (length === 2) numbers.set(element, bytes.readUInt16LE(offset + 8));
    last = element;
    offset += 8 + length;
  }
  const hasDataSet = numbers.get(0x0800) !== noDataSet;
  const isWhole = numbers.has(0x0110) && numbers.has(0x0800);
  const expected = hasDataSet ? requests.store : requests.echo;
  return isWhole && numbers.get(0x0100) === expected ? hasDataSet : undefined;
}
