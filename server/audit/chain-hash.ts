import { createHash } from 'node:crypto';
import canonicalize from 'canonicalize';
import type { AuditLineEntity } from './audit-line-entity.ts';

/** The hash before the first line. */
export const CHAIN_START = '0'.repeat(64);

/** Leaf and node hashes differ by their first byte, as in RFC 6962, section 2.1. */
const LEAF = Buffer.of(0x00);
const NODE = Buffer.of(0x01);

/**
 * h_n = SHA-256(0x01 + h_(n−1) + SHA-256(0x00 + JCS(line))), JCS being canonical JSON (RFC 8785).
 *
 * @param previousHash 64 hex digits
 * @returns 64 hex digits
 */
export function chainHash(previousHash: string, line: Omit<AuditLineEntity, 'hash'>): string {
  const { sequence, atMs, whoId, who, action, objectKind, objectId, objectName } = line;
  const { projectId, summary, detail, requestId } = line;
  const row = {
    ...{ sequence, atMs, whoId, who, action, objectKind, objectId, objectName },
    ...{ projectId, summary, detail, requestId },
  };
  const leaf = sha256(LEAF, Buffer.from(canonicalize(row) ?? '', 'utf8'));
  return sha256(NODE, Buffer.from(previousHash, 'hex'), leaf).toString('hex');
}

function sha256(...parts: Buffer[]): Buffer {
  return createHash('sha256').update(Buffer.concat(parts)).digest();
}
