import type { Response } from 'express';

/** A file that a route of the contract answers with (`file: true`). */
export interface FileAnswer {
  readonly name: string;
  readonly type: string;
  readonly bytes: Buffer;
}

/** Sent to be saved, never to be shown: nothing inside it may run in this origin. */
export function sendFile(response: Response, { name, type, bytes }: FileAnswer): void {
  response
    .attachment(name) // RFC 6266, escaped
    .type(type)
    .set('Content-Security-Policy', "sandbox; default-src 'none'")
    .send(bytes);
}
