import { createTransport, type Transporter } from 'nodemailer';
import type { Config } from '../config/config.js';
import { enqueue } from '../outbox/outbox.js';
import type { GlobalScope } from '../database/scope.js';
import { mailHtml, mailText, type MailContent } from './mail-content.js';

/** A letter as the outbox holds it. `attachments` name documents that are made when the letter is sent. */
export type Letter = {
  to: string;
  /** The shop's name for letters to its customers; ours for letters to members. */
  fromName: string;
  replyTo?: string;
  subject: string;
  content: MailContent;
  attachments?: readonly DocumentRef[];
};
/** A document by its kind and id, such as `{ kind: 'invoice', shopId, id }`. */
export type DocumentRef = { kind: string; shopId: string; id: string };
export type RenderedDocument = { name: string; type: string; body: Buffer };
export type DocumentMaker = (ref: DocumentRef) => Promise<RenderedDocument>;

export const MAIL = 'mail';
/** Leaves a letter in the outbox, in the transaction of its cause. */
export const sendMail = (scope: GlobalScope, letter: Letter): Promise<void> => enqueue(scope, MAIL, letter);

/** Sends letters over SMTP. The outbox message's id is the Message-ID, so that a repeat can be recognized as one. */
export class Mailer {
  private readonly transport: Transporter;

  constructor(
    private readonly config: Config['mail'],
    private readonly makeDocument: DocumentMaker,
  ) {
    this.transport = createTransport({
      host: config.host,
      port: config.port,
      secure: config.tls && config.port === 465,
      requireTLS: config.tls,
      ignoreTLS: !config.tls,
      ...(config.user ? { auth: { user: config.user, pass: config.password } } : {}),
      connectionTimeout: 10_000,
      socketTimeout: 20_000,
    });
  }

  async send(letter: Letter, messageId: string): Promise<void> {
    const attachments = await Promise.all((letter.attachments ?? []).map((ref) => this.makeDocument(ref)));
    const [, domain = 'localhost'] = this.config.from.split('@');
    await this.transport.sendMail({
      messageId: `<${messageId}@${domain}>`,
      from: { name: letter.fromName, address: this.config.from },
      to: letter.to,
      ...(letter.replyTo ? { replyTo: letter.replyTo } : {}),
      subject: letter.subject,
      text: mailText(letter.content),
      html: mailHtml(letter.content),
      attachments: attachments.map(({ name, type, body }) => ({
        filename: name,
        contentType: type,
        content: body,
      })),
    });
  }

  close(): void {
    this.transport.close();
  }
}
