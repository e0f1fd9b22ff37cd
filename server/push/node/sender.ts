/**
 * One association with a sender. The protocol library reads and writes the messages; what they carry goes to the server as whole objects,
 * one at a time, and the sender has its answer only when the server has stored or refused it: a sender that waits for answers, as
 * nearly all do, is slowed down to the pace of the door.
 */
import { Writable } from 'node:stream';
import type { Socket } from 'node:net';
import type { association, Dataset, requests, responses } from 'dcmjs-dimse';
import { agreeContexts } from './contexts';
import { dicomFile } from './dicom-file';
import type { GatedSocket } from './gated-socket';
import type { NodeSettings, Stranger } from './messages';
import { MessageOrder } from './message-order';
import { longestData } from './pdu-frames';
import { protocol } from './protocol';

/** What an association asks of the thread. */
export interface Post {
  knock(calling: string, called: string): void;
  /** Resolves once there is room for another object in memory. */
  room(): Promise<void>;
  object(bytes: Uint8Array<ArrayBuffer> | null): void;
}

/** A sender that goes on beyond so many times the limit of an object is cut off. */
const farTooLong = 4;

/** Rejections: PS3.8 table 9-21, [result, source, reason]. A wrong address is a calling title that is not recognised there. */
const rejections: Readonly<Record<Stranger | 'not-now', readonly [number, number, number]>> = {
  'calling-title': [1, 1, 3],
  address: [1, 1, 3],
  'called-title': [1, 1, 7],
  'not-now': [2, 3, 1],
};

/** Fragments of a data set. They are kept as they came and put together once; over the limit they are counted, and not kept. */
class Gathered extends Writable {
  readonly fragments: Buffer[] = [];
  bytes = 0;

  constructor(
    private readonly limit: number,
    private readonly onFarTooLong: () => void,
  ) {
    // The library waits for `drain` in the middle of a unit and lets the next one overtake: it must never see a full stream.
    super({ highWaterMark: 2 * longestData });
  }

  override _write(fragment: Buffer, _encoding: BufferEncoding, done: () => void): void {
    this.bytes += fragment.length;
    if (this.bytes <= this.limit) this.fragments.push(fragment);
    else this.fragments.length = 0;
    if (this.bytes > farTooLong * this.limit) this.onFarTooLong();
    done();
  }
}

export class Sender extends protocol.Scp {
  private requested: association.Association | undefined;
  private gathered: { readonly stream: Gathered; readonly room: Promise<void> } | undefined;
  private answerNow: ((status: number, comment: string) => void) | undefined;
  private outcome = { status: 0, comment: '' };

  constructor(
    private readonly gate: GatedSocket,
    private readonly settings: NodeSettings,
    private readonly post: Post,
  ) {
    // The library asks of a socket its events, write, end and setTimeout; the gate has these.
    super(gate as unknown as Socket, { pduTimeout: 10 * settings.patienceMs });
    this.on('networkError', () => gate.abort('invalid'));
  }

  override associationRequested(requested: association.Association): void {
    this.gate.hold();
    this.requested = requested;
    this.post.knock(requested.getCallingAeTitle(), requested.getCalledAeTitle());
  }

  /** The server's word on who knocked. */
  admit(refused: Stranger | 'not-now' | null): void {
    if (this.requested === undefined) return;
    if (refused !== null) {
      this.sendAssociationReject(...rejections[refused]);
      this.gate.end();
      return;
    }
    const agreed = agreeContexts(this.requested, this.settings.accepts.transferSyntaxes);
    // The library answers with the sender's own limit, and with none where that has none. Our answers are shorter than any limit.
    protocol.Implementation.setMaxPduLength(longestData);
    this.requested.setMaxPduLength(longestData);
    this.gate.agree(new MessageOrder(agreed));
    this.sendAssociationAccept();
    this.gate.release();
  }

  override associationReleaseRequested(): void {
    this.sendAssociationReleaseResponse();
    this.gate.end();
  }

  override abort(): void {
    this.gate.destroy();
  }

  override cEchoRequest(request: requests.CEchoRequest, answer: (response: responses.CEchoResponse) => void): void {
    const response = protocol.responses.CEchoResponse.fromRequest(request);
    response.setStatus(protocol.constants.Status.Success);
    answer(response);
  }

  override createStoreWritableStream(): Writable {
    this.gate.hold();
    const room = this.post.room().then(() => this.gate.release());
    const stream = new Gathered(this.settings.objectBytes, () => this.gate.abort('invalid'));
    this.gathered = { stream, room };
    return stream;
  }

  override createDatasetFromStoreWritableStream(
    _stream: Writable,
    context: association.PresentationContext,
    done: (dataset: Dataset) => void,
  ): void {
    const { gathered } = this;
    if (gathered === undefined) return;
    this.gathered = undefined;
    this.gate.hold();
    this.answerNow = (status, comment) => {
      this.outcome = { status, comment };
      // The library wants a data set: it never sees the one that came.
      done(new protocol.Dataset({}));
      setImmediate(() => this.gate.release());
    };
    const { stream, room } = gathered;
    const isKept = stream.bytes <= this.settings.objectBytes;
    // A small object may be whole before there is room for it.
    void room.then(() => this.post.object(isKept ? dicomFile(context.getAcceptedTransferSyntaxUid() ?? '', stream.fragments) : null));
  }

  /** The server's word on the object that it was given. */
  answer(status: number, comment: string): void {
    this.answerNow?.(status, comment);
    this.answerNow = undefined;
  }

  override cStoreRequest(request: requests.CStoreRequest, answer: (response: responses.CStoreResponse) => void): void {
    const response = protocol.responses.CStoreResponse.fromRequest(request);
    response.setStatus(this.outcome.status);
    if (this.outcome.comment !== '') response.setErrorComment(this.outcome.comment);
    answer(response);
  }
}
