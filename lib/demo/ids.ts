import type { Random } from './random';

/**
 * A version 7 UUID (RFC 9562, 5.7) of that moment whose random part comes from the demo's own stream, so that
 * the same seed gives the same ids.
 */
export function demoId(random: Random, at: Date): string {
  const time = at.getTime().toString(16).padStart(12, '0');
  const part = (length: number) => Array.from({ length }, () => random.whole(0, 15).toString(16)).join('');
  const variant = (8 + random.whole(0, 3)).toString(16);
  return `${time.slice(0, 8)}-${time.slice(8)}-7${part(3)}-${variant}${part(3)}-${part(12)}`;
}
