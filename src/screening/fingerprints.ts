/** Fingerprint of the method catalogue: another number in it is another catalogue. */
import { createHash } from 'node:crypto';
import { catalogueText } from '../engineering/methods.js';

export function methodsFingerprint(): string {
  return createHash('sha256').update(catalogueText()).digest('hex').slice(0, 16);
}
