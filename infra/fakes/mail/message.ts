/** A file that came with a message. The content is base64, so that the whole message is plain JSON. */
export interface KeptAttachment {
  name: string;
  contentType: string;
  sizeBytes: number;
  contentBase64: string;
}

/** A message as the fake keeps it. Addresses are lower case; instants are UTC ISO texts. */
export interface KeptMessage {
  id: string;
  /** The Message-ID header with its angle brackets: what makes two deliveries the same message. */
  messageId: string;
  receivedAt: string;
  /** How often it was delivered: more than 1 when the sender repeated it. */
  deliveries: number;
  from: string;
  /** Everyone the envelope names, hidden recipients included. */
  to: string[];
  replyTo: string;
  subject: string;
  text: string;
  html: string;
  attachments: KeptAttachment[];
}
