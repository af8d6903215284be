/** Absolute addresses as the world knows them. The site's own idea of its address is frozen at build time and not to be asked. */
import { config } from '#server/config.ts';

/** Of a path with its leading slash. */
export const publicAddress = (path: string): string => new URL(path, config().publicUrl).href;

/**
 * A name for a thing that stays the same wherever its page moves (RFC 4151). The year is that in which the house began.
 */
export const tagOf = (kind: string, publicId: string): string => `tag:${new URL(config().publicUrl).hostname},2026:${kind}:${publicId}`;
