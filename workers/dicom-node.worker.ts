/** The thread that listens for scanners: what it does is in server/push/node; here it gets its port and its settings. */
import { parentPort, workerData } from 'node:worker_threads';
import { runNode } from '../server/push/node/node-thread';
import type { NodeSettings } from '../server/push/node/messages';

if (parentPort === null) throw new Error('the DICOM node is a worker thread');
runNode(parentPort, workerData as NodeSettings);
