/** An address as the log keeps it: a customer's link and the token of a letter are secrets. */
export function maskedUrl(url: string): string {
  return url.replace(/\/(api\/links|c)\/[^/?]+/, '/$1/[masked]').replace(/([?&]token=)[^&]+/, '$1[masked]');
}
