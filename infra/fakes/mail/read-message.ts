import { randomUUID } from 'node:crypto';
import type { Readable } from 'node:stream';
import { type AddressObject, type Attachment, type ParsedMail, simpleParser } from 'mailparser';
import type { KeptAttachment, KeptMessage } from './message.js';

/**
 * Reads a message as it comes over SMTP (RFC 5322).
 * @param envelopeTo the recipients named in the envelope, which alone decide who gets it
 */
export async function readMessage(source: Readable, envelopeTo: string[]): Promise<KeptMessage> {
  const mail = await simpleParser(source);
  const id = randomUUID();
  return {
    id,
    messageId: mail.messageId ?? `<${id}@without.message.id>`,
    receivedAt: new Date().toISOString(),
    deliveries: 1,
    from: addressText(mail.from),
    to: [...new Set(envelopeTo.map((address) => address.toLowerCase()))],
    replyTo: addressText(mail.replyTo),
    subject: mail.subject ?? '',
    ...bodyOf(mail),
    attachments: mail.attachments.map(keepAttachment),
  };
}

function bodyOf(mail: ParsedMail): Pick<KeptMessage, 'text' | 'html'> {
  return { text: mail.text ?? '', html: mail.html || '' };
}

function addressText(address: AddressObject | undefined): string {
  return address?.text ?? '';
}

function keepAttachment({ filename, contentType, size, content }: Attachment, index: number): KeptAttachment {
  return {
    name: filename ?? `attachment-${index + 1}`,
    contentType,
    sizeBytes: size,
    contentBase64: content.toString('base64'),
  };
}
