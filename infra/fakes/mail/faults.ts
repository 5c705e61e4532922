/** What shall go wrong with the next messages. */
export interface PlannedFaults {
  /** How many of the next messages are answered with an error. */
  reject: number;
  /** The SMTP answer to them: 4xx asks the sender to try again, 5xx says never. */
  rejectCode: number;
  /** Keep a rejected message all the same, as when the answer to an accepted message is lost on its way. */
  keepRejected: boolean;
  /** How many of the next messages are answered late. */
  delay: number;
  /** By how many milliseconds. */
  delayMs: number;
}

/** The faults of one message. */
export interface MessageFaults {
  delayMs: number;
  rejection?: { code: number; kept: boolean };
}

const none: PlannedFaults = { reject: 0, rejectCode: 451, keepRejected: false, delay: 0, delayMs: 0 };

/** The faults a test has ordered, used up message by message. */
export class Faults {
  private planned = none;

  /** Replaces what was ordered; fields left out mean no such fault. */
  plan(wanted: Partial<PlannedFaults>): void {
    this.planned = { ...none, ...wanted };
  }

  remaining(): PlannedFaults {
    return { ...this.planned };
  }

  /** The faults of the next message. */
  next(): MessageFaults {
    const { reject, rejectCode, keepRejected, delay, delayMs } = this.planned;
    this.planned = { ...this.planned, reject: Math.max(0, reject - 1), delay: Math.max(0, delay - 1) };
    return {
      delayMs: delay > 0 ? delayMs : 0,
      ...(reject > 0 && { rejection: { code: rejectCode, kept: keepRejected } }),
    };
  }
}
