/**
 * The socket that the protocol library sees. Behind it the real one is read only as fast as units are dealt with: a unit is looked over,
 * handed on whole, and the next waits while the gate is held. A sender that breaks the rules gets an A-ABORT (DICOM PS3.8
 * section 9.3.8) and is gone; so does one that keeps us waiting in the middle of something.
 */
import { EventEmitter } from 'node:events';
import type { Socket } from 'node:net';
import { PduFrames, pduTypes, violations, type Violation } from './pdu-frames';
import type { MessageOrder } from './message-order';

/** Answers are a few hundred bytes: a sender that lets so many pile up does not read them. */
const longestUnread = 64 * 1024;
const serviceProvider = 2;
/** Whoever connects has something to say. */
const strangersPatienceMs = 10_000;

export class GatedSocket extends EventEmitter {
  private readonly frames = new PduFrames();
  private order: MessageOrder | undefined;
  /** How many reasons there are to wait. */
  private holds = 0;
  private ending = false;
  private timer: NodeJS.Timeout | undefined;

  constructor(
    private readonly outer: Socket,
    private readonly patienceMs: number,
  ) {
    super();
    outer.on('data', (chunk: Buffer) => {
      this.frames.add(chunk);
      this.pass();
    });
    outer.on('end', () => this.destroy());
    // Whatever the network says, the connection is over; the library would only write it into its log.
    outer.on('error', () => this.destroy());
    outer.on('close', () => {
      clearTimeout(this.timer);
      this.ending = true;
      this.emit('close');
    });
    this.wait();
  }

  /** From here on messages are checked against the contexts that were agreed. */
  agree(order: MessageOrder): void {
    this.order = order;
  }

  /** No further unit is handed on, and soon none is read, until each `hold` has had its `release`. */
  hold(): void {
    this.holds++;
    clearTimeout(this.timer);
  }

  release(): void {
    this.holds--;
    if (this.holds > 0 || this.ending) return;
    this.wait();
    this.pass();
  }

  write(bytes: Buffer): boolean {
    if (this.ending) return false;
    if (this.outer.writableLength > longestUnread) this.destroy();
    return this.outer.write(bytes);
  }

  /** Says no more, and hears no more, once what was written has gone out. */
  end(): void {
    if (this.ending) return;
    this.ending = true;
    this.outer.end();
    this.outer.resume();
    this.wait();
  }

  /** Tells the sender that it is over, and why. */
  abort(violation: Violation): void {
    if (this.ending) return;
    this.outer.write(Buffer.from([pduTypes.abort, 0, 0, 0, 0, 4, 0, 0, serviceProvider, violations[violation]]));
    this.end();
  }

  destroy(): void {
    this.ending = true;
    this.outer.destroy();
  }

  /** The library sets a limit for silence, three minutes; the gate's own is shorter and for more than silence. */
  setTimeout(): this {
    return this;
  }

  private pass(): void {
    while (this.holds === 0 && !this.ending) {
      const unit = this.frames.next();
      if (unit === undefined) break;
      if (typeof unit === 'string') this.abort(unit);
      else this.hand(unit);
    }
    // A unit that waits is at most one; what comes after it stays in the network.
    if (this.holds > 0) this.outer.pause();
    else this.outer.resume();
  }

  private hand(unit: Buffer): void {
    const violation = unit[0] === pduTypes.data ? this.violationOf(unit) : undefined;
    if (violation !== undefined) {
      this.abort(violation);
      return;
    }
    this.wait();
    this.emit('data', unit);
  }

  private violationOf(unit: Buffer): Violation | undefined {
    return this.order === undefined ? 'unexpected' : this.order.check(unit);
  }

  /** Starts the clock for the next whole unit. */
  private wait(): void {
    clearTimeout(this.timer);
    this.timer = setTimeout(
      () => {
        if (this.ending || this.order === undefined) this.destroy();
        else this.abort('unexpected');
      },
      this.order === undefined ? strangersPatienceMs : this.patienceMs,
    );
  }
}
