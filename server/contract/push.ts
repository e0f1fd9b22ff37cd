/**
 * Push from the scanner: who may send, what came, and what becomes of it. Images that a scanner sent wait in its inbox until somebody makes
 * a case of them, discards them, or nobody did for as long as the site says.
 */
import { z } from 'zod';
import { components, refusalCodes, uses } from './images';
import { everyMember, identifier, route, timestamp } from './route';

/** DICOM PS3.5 table 6.2-1, VR AE: up to 16 printable characters without a backslash; spaces at the ends mean nothing. */
export const aeTitleSchema = z
  .string()
  .trim()
  .regex(/^[ -[\]-~]{1,16}$/, 'an AE title has 1 to 16 plain characters and no backslash');

const addressSchema = z.union(
  [z.ipv4(), z.ipv6(), z.cidrv4(), z.cidrv6()],
  'must be an IP address or a subnet, as 10.1.2.3 or 10.1.2.0/24',
);

/** Why something that a scanner sent, or the scanner itself, was not taken. */
export const pushRefusals = [...refusalCodes, 'calling-title', 'called-title', 'address', 'busy'] as const;
export type PushRefusal = (typeof pushRefusals)[number];

const tokenSchema = z.object({
  id: identifier,
  drawnAt: timestamp,
  drawnBy: z.string(),
  lastUsedAt: timestamp.nullable(),
});

const pushSchema = z.object({
  /** What scanners are to send to; null where the DICOM node is off. */
  node: z.object({ aeTitle: z.string(), port: z.number().int(), loopback: z.boolean() }).nullable(),
  aeTitle: z.string().nullable(),
  addresses: z.array(z.string()),
  received: z.object({ count: z.number().int(), lastAt: timestamp.nullable() }),
  refused: z.object({ count: z.number().int(), lastAt: timestamp.nullable(), last: z.enum(pushRefusals).nullable() }),
  /** Those that are not revoked. */
  tokens: z.array(tokenSchema),
  /** Whether the asking member may change any of it. */
  mayChange: z.boolean(),
});
export type ScannerPush = z.infer<typeof pushSchema>;

const scannerParams = z.object({ scannerId: identifier });
const settingRoles = ['lead-technologist', 'administrator'] as const;

export const readPush = route({
  method: 'get',
  path: '/api/scanners/:scannerId/push',
  summary: 'How a scanner may send, and when it last did',
  access: everyMember,
  params: scannerParams,
  output: pushSchema,
});

export const changePush = route({
  method: 'put',
  path: '/api/scanners/:scannerId/push',
  summary: 'Set the AE title that a scanner calls itself by, and the addresses that it may call from',
  access: settingRoles,
  params: scannerParams,
  body: z.object({ aeTitle: aeTitleSchema.nullable(), addresses: z.array(addressSchema).max(32) }),
  output: pushSchema,
});

export const drawToken = route({
  method: 'post',
  path: '/api/scanners/:scannerId/tokens',
  summary: 'Draw a token with which a scanner may send over the web. It is shown this once',
  access: settingRoles,
  params: scannerParams,
  status: 201,
  output: z.object({ token: z.string(), push: pushSchema }),
});

export const revokeToken = route({
  method: 'delete',
  path: '/api/scanners/:scannerId/tokens/:tokenId',
  summary: 'Revoke a token at once',
  access: settingRoles,
  params: scannerParams.extend({ tokenId: identifier }),
  output: pushSchema,
});

export const inboxImageSchema = z.object({
  id: identifier,
  rows: z.number().int(),
  columns: z.number().int(),
  frames: z.number().int(),
  component: z.enum(components),
  use: z.enum(uses),
  receivedAt: timestamp,
  /** Of the scan, HH:MM:SS; null where the header is silent. */
  timeOfDay: z.string().nullable(),
});
export type InboxImage = z.infer<typeof inboxImageSchema>;

export const inboxSchema = z.object({
  /** Newest first; images without a series are each one by itself. Within a series in the order in which they came. */
  series: z.array(z.object({ images: z.array(inboxImageSchema).min(1) })),
  /** How many images wait; the oldest are left out of `series` where there are very many. */
  total: z.number().int(),
  /** Days after which the server deletes what nobody took. */
  keptDays: z.number().int(),
});
export type Inbox = z.infer<typeof inboxSchema>;

export const readInbox = route({
  method: 'get',
  path: '/api/scanners/:scannerId/inbox',
  summary: 'Images that a scanner sent and that are on no case, by series',
  access: everyMember,
  params: scannerParams,
  output: inboxSchema,
});

export const discardImages = route({
  method: 'post',
  path: '/api/scanners/:scannerId/inbox/discards',
  summary: 'Delete images of the inbox. Those that are on a case by now stay',
  access: everyMember,
  params: scannerParams,
  body: z.object({ images: z.array(identifier).min(1).max(1000) }),
  output: z.object({ discarded: z.number().int() }),
});

/** Elements of the answer by tag, in the DICOM JSON model (PS3.18 annex F). */
const dicomJson = z.record(z.string(), z.object({ vr: z.string(), Value: z.array(z.unknown()).optional() }));

export const storeInstances = route({
  method: 'post',
  path: '/api/dicomweb/studies',
  summary: 'Store DICOM objects, one a part (PS3.18 section 10.5). 200: all were taken; 202: some; 409: none',
  access: 'scanner',
  takes: 'multipart-dicom',
  answers: 'dicom-json',
  output: dicomJson,
});
