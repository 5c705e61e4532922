import { open } from 'node:fs/promises';
import { isUtf8 } from 'node:buffer';
import { fileTypeFromBuffer } from 'file-type/core';

/** As much of a file as its type is told by. */
const HEAD_BYTES = 4100;

/**
 * What a file is by its first bytes, as a media type; null for what has no known signature and is no plain text.
 *
 * The name is asked only to tell CSV from other plain text, which no content can. Markup is no plain text, whatever it
 * is called: a browser might run it.
 */
export async function fileKind(path: string, name: string): Promise<string | null> {
  const head = await readHead(path);
  if (head.length === 0) return null;
  const signed = await fileTypeFromBuffer(head);
  if (signed) return signed.mime;
  return isPlainText(head) ? textKind(head.toString(), name) : null;
}

async function readHead(path: string): Promise<Buffer> {
  const file = await open(path, 'r');
  try {
    const { buffer, bytesRead } = await file.read(Buffer.alloc(HEAD_BYTES), 0, HEAD_BYTES, 0);
    return buffer.subarray(0, bytesRead);
  } finally {
    await file.close();
  }
}

/** UTF-8 without control characters besides tab and line ends. The cut at the head's end may split a character. */
function isPlainText(head: Buffer): boolean {
  const whole = head.length < HEAD_BYTES ? head : head.subarray(0, lastWholeCharacter(head));
  return (
    isUtf8(whole) && !whole.some((byte) => (byte < 32 && ![9, 10, 12, 13].includes(byte)) || byte === 127)
  );
}

/** Where the last character that is there whole ends: a UTF-8 character begins with a byte that is not 10xxxxxx. */
function lastWholeCharacter(head: Buffer): number {
  let end = head.length;
  while (end > head.length - 4 && (head[end - 1]! & 0b1100_0000) === 0b1000_0000) end -= 1;
  return head[end - 1]! < 0b1000_0000 ? end : end - 1;
}

function textKind(text: string, name: string): string | null {
  const start = text.replace(/^\uFEFF/, '').trimStart();
  if (start.startsWith('<')) return null;
  // A drawing in DXF's text form begins with group code 0 and the word SECTION, comments (code 999) aside.
  if (/^(?:999\r?\n.*\r?\n\s*)*0\r?\n\s*SECTION\r?\n/.test(start)) return 'image/vnd.dxf';
  return /\.csv$/i.test(name) ? 'text/csv' : 'text/plain';
}
