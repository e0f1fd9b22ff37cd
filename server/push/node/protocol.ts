/**
 * The protocol library, with its log shut: it writes AE titles and command sets, which a sender fills as it likes. It is loaded as the
 * CommonJS package it is, from node_modules also in production: its names cannot be imported one by one.
 */
import { createRequire } from 'node:module';
import type * as dimse from 'dcmjs-dimse';

export const protocol = createRequire(import.meta.url)('dcmjs-dimse') as typeof dimse;
protocol.log.setLevel('silent', false);
