/**
 * Push from the scanner: who may send as which scanner, and what was seen of it. Nothing of a refused sender is kept but when and why:
 * an AE title or an address that is not on the list is a stranger's, and may hold anything.
 */
import { index, integer, pgTable, text, timestamp, uuid } from 'drizzle-orm/pg-core';
import { members } from './people';
import { scanners } from './scanners';

const moment = (column: string) => timestamp(column, { withTimezone: true, mode: 'date' });

/** One row a scanner, from the first time somebody sets it up or it sends. */
export const scannerPush = pgTable('scanner_push', {
  scannerId: uuid('scanner_id')
    .primaryKey()
    .references(() => scanners.id),
  /** The name it calls itself by; one scanner of the installation a name, for the name decides whose inbox it is. */
  aeTitle: text('ae_title').unique('scanner_ae_title'),
  /** Addresses and subnets (RFC 4632) it may call from. None: from nowhere. */
  addresses: text().array().notNull().default([]),
  receivedCount: integer('received_count').notNull().default(0),
  lastReceivedAt: moment('last_received_at'),
  refusedCount: integer('refused_count').notNull().default(0),
  lastRefusedAt: moment('last_refused_at'),
  /** A code of the contract's closed list, never the words of a sender. */
  lastRefusal: text('last_refusal'),
});

/** Tokens that let a scanner send over the web. The token itself is shown once and not kept. */
export const scannerTokens = pgTable(
  'scanner_tokens',
  {
    id: uuid().primaryKey().defaultRandom(),
    scannerId: uuid('scanner_id')
      .notNull()
      .references(() => scanners.id),
    /** SHA-256 of the token: 256 random bits need no slow hash. */
    tokenHash: text('token_hash').notNull().unique('scanner_token_hash'),
    drawnById: uuid('drawn_by_id')
      .notNull()
      .references(() => members.id),
    drawnAt: moment('drawn_at').notNull().defaultNow(),
    lastUsedAt: moment('last_used_at'),
    revokedAt: moment('revoked_at'),
  },
  (table) => [index('tokens_of_scanner').on(table.scannerId)],
);

/** Objects whose image was discarded: they go once nobody has used the same values for a while. */
export const discardedValues = pgTable('discarded_values', {
  valuesDigest: text('values_digest').primaryKey(),
  discardedAt: moment('discarded_at').notNull().defaultNow(),
});
