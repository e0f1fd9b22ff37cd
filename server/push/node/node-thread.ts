/**
 * The thread that listens for scanners. It has a thread of its own for what it does with bytes of strangers: whatever happens in it, the
 * server goes on, notices, and starts it again. It has no database, no key and no log.
 */
import { createServer, type Socket } from 'node:net';
import type { MessagePort } from 'node:worker_threads';
import { errorCode } from '../../error-code';
import { GatedSocket } from './gated-socket';
import type { FromNode, NodeSettings, ToNode } from './messages';
import { Sender } from './sender';
import { openPlaces } from './places';

/** Listens until it is told to close. */
export function runNode(port: MessagePort, settings: NodeSettings): void {
  const tell = (message: FromNode, handedOver: ArrayBuffer[] = []) => port.postMessage(message, handedOver);
  const senders = new Map<number, Sender>();
  const places = openPlaces(settings.objects);
  let newest = 0;

  const receive = (socket: Socket): void => {
    const association = ++newest;
    const gate = new GatedSocket(socket, settings.patienceMs);
    const address = socket.remoteAddress ?? '';
    const sender = new Sender(gate, settings, {
      knock: (calling, called) => tell({ kind: 'knocks', association, calling, called, address }),
      room: () => places.take(association),
      object: (bytes) => tell({ kind: 'object', association, bytes }, bytes === null ? [] : [bytes.buffer]),
    });
    senders.set(association, sender);
    gate.on('close', () => {
      senders.delete(association);
      places.leave(association);
      tell({ kind: 'leaves', association });
    });
  };

  const server = createServer({ noDelay: true }, receive);
  server.maxConnections = settings.connections;
  server.on('error', (error) => tell({ kind: 'cannot-listen', code: errorCode(error) ?? 'unknown' }));
  server.listen(settings.port, settings.host, () => {
    const address = server.address();
    if (typeof address === 'object' && address !== null) tell({ kind: 'listens', port: address.port });
  });

  port.on('message', (message: ToNode) => {
    if (message.kind === 'live') tell({ kind: 'lives' });
    else if (message.kind === 'close') process.exit(0);
    else {
      const sender = senders.get(message.association);
      if (message.kind === 'admit') sender?.admit(message.refused);
      else {
        places.leave(message.association);
        sender?.answer(message.status, message.comment);
      }
    }
  });
}
