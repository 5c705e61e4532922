/** What a letter says: plain paragraphs and at most one button. Written once, sent as text and as HTML. */
export type MailContent = {
  heading: string;
  paragraphs: readonly string[];
  action?: { label: string; url: string };
  /** Small print, such as who sent this and why. */
  footer: string;
};

export function mailText({ heading, paragraphs, action, footer }: MailContent): string {
  const link = action ? [`${action.label}: ${action.url}`] : [];
  return [heading, ...paragraphs, ...link, '--', footer].join('\n\n');
}

export function mailHtml({ heading, paragraphs, action, footer }: MailContent): string {
  const body = paragraphs.map((text) => `<p style="margin:0 0 14px">${lines(text)}</p>`).join('');
  const button = action
    ? `<p style="margin:22px 0"><a href="${escape(action.url)}" style="background:#1D3F8F;color:#ffffff;padding:12px 18px;border-radius:8px;text-decoration:none;font-weight:600">${escape(action.label)}</a></p>
<p style="margin:0 0 14px;color:#56606F;font-size:13px;word-break:break-all">${escape(action.url)}</p>`
    : '';
  return `<!doctype html><html lang="en"><body style="margin:0;background:#EEF1F4;padding:24px;font:15px/1.5 'Segoe UI',Helvetica,Arial,sans-serif;color:#141B26">
<div style="max-width:560px;margin:0 auto;background:#ffffff;border:1px solid #D8DEE6;border-radius:12px;padding:28px">
<h1 style="font-size:20px;margin:0 0 16px">${escape(heading)}</h1>${body}${button}
<p style="margin:24px 0 0;padding-top:14px;border-top:1px solid #D8DEE6;color:#56606F;font-size:13px">${lines(footer)}</p>
</div></body></html>`;
}

const ENTITIES: Record<string, string> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};
const escape = (text: string) => text.replace(/[&<>"']/g, (character) => ENTITIES[character] ?? character);
const lines = (text: string) => escape(text).replace(/\n/g, '<br>');
