export type ConfirmQuestion = {
  title: string;
  text: string;
  /** The button that goes on, named after what it does: "Archive". */
  action: string;
  /** `harm` for what cannot be taken back. */
  tone?: 'plain' | 'harm';
  cancel?: string;
  /** Asks why, in the person's own words. */
  reason?: { label: string; required: boolean };
};
export type ConfirmAnswer = { reason: string };
