import type { KeptMessage } from './message.js';

/** A message as `/api/messages` gives it: attachments by address, and the links ready to follow. */
export interface MessageJson extends Omit<KeptMessage, 'attachments'> {
  /** Every http(s) address in the text and in the HTML's links, each once, in order. */
  links: string[];
  attachments: { name: string; contentType: string; sizeBytes: number; url: string }[];
}

export function toMessageJson(message: KeptMessage): MessageJson {
  return {
    ...message,
    links: linksOf(message),
    attachments: message.attachments.map(({ name, contentType, sizeBytes }, index) => ({
      name,
      contentType,
      sizeBytes,
      url: attachmentPath(message.id, index),
    })),
  };
}

export function attachmentPath(id: string, index: number): string {
  return `/messages/${id}/attachments/${index}`;
}

/** Every http(s) address in the text and in the HTML's links, each once, in order. */
export function linksOf({ text, html }: KeptMessage): string[] {
  const inText = text.match(/https?:\/\/[^\s<>"')\]]+/g) ?? [];
  const inHtml = [...html.matchAll(/href="(https?:\/\/[^"]+)"/g)].map(([, address]) =>
    unescapeHtml(address ?? ''),
  );
  return [...new Set([...inText, ...inHtml])];
}

function unescapeHtml(text: string): string {
  return text.replaceAll('&amp;', '&').replaceAll('&#x3D;', '=').replaceAll('&quot;', '"');
}
