/** What a template makes: the same said as text and as HTML. */
export interface MailContent {
  subject: string
  text: string
  html: string
}

/** Text as it may stand in HTML, between tags and in attributes. */
export function escapeHtml(text: string): string {
  return text
    .replaceAll('&', '&amp;')
    .replaceAll('<', '&lt;')
    .replaceAll('>', '&gt;')
    .replaceAll('"', '&quot;')
    .replaceAll("'", '&#39;')
}
