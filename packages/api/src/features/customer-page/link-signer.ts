import { createHmac, timingSafeEqual } from 'node:crypto';

const ID_BYTES = 16;
const TOKEN = /^[A-Za-z0-9_-]{64}$/;

/**
 * Makes and reads the tokens in customers' addresses: a link's id and an HMAC-SHA-256 over it, as 64 URL-safe
 * characters. Nobody without the server's secret can make one up, and nothing secret has to be stored.
 */
export class LinkSigner {
  constructor(private readonly secret: string) {}

  tokenOf(linkId: string): string {
    const id = Buffer.from(linkId.replaceAll('-', ''), 'hex');
    return Buffer.concat([id, this.sign(id)]).toString('base64url');
  }

  /** The id in a token of ours; null for anything else. */
  idIn(token: string): string | null {
    if (!TOKEN.test(token)) return null;
    const bytes = Buffer.from(token, 'base64url');
    const id = bytes.subarray(0, ID_BYTES);
    if (!timingSafeEqual(bytes.subarray(ID_BYTES), this.sign(id))) return null;
    return id.toString('hex').replace(/^(.{8})(.{4})(.{4})(.{4})(.{12})$/, '$1-$2-$3-$4-$5');
  }

  /** The purpose is signed too, so that no other signature made with the same secret passes for a link. */
  private sign(id: Buffer): Buffer {
    return createHmac('sha256', this.secret).update('customer-link\n').update(id).digest();
  }
}
