const PROTOCOLS = ['http:', 'https:', 'mailto:'];
const LONGEST = 2000;

/**
 * Whether an address may stand behind a link in a record: absolute, and http, https or mailto. The browser's own reading
 * of the address decides, so that `java\nscript:` is what a browser would make of it.
 */
export function isSafeLink(href: unknown): href is string {
  if (typeof href !== 'string' || href.length > LONGEST || href !== href.trim()) return false;
  try {
    return PROTOCOLS.includes(new URL(href).protocol);
  } catch {
    return false;
  }
}

/** An address as somebody types it, made whole ("example.org" → "https://example.org"), or null where it cannot be one. */
export function linkFromTyped(typed: string): string | null {
  const text = typed.trim();
  if (text === '' || /\s/.test(text)) return null;
  if (/^[^\s@/:]+@[^\s@/:]+\.[^\s@/:]+$/.test(text)) return `mailto:${text}`;
  const whole = /^[a-z][a-z0-9+.-]*:(?!\d)/i.test(text) ? text : `https://${text}`;
  return isSafeLink(whole) ? whole : null;
}
