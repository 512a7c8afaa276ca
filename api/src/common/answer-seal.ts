import { createCipheriv, createDecipheriv, createHash, randomBytes } from 'node:crypto';

const CIPHER = 'aes-256-gcm';
const IV_BYTES = 12;
const TAG_BYTES = 16;

const cipherKey = (key: string) => createHash('sha256').update(`answer\n${key}`).digest();

/**
 * Keep an answer so that only whoever holds the request's key can read it: answers may carry
 * secrets, such as a review link's token, that are nowhere else stored in clear.
 */
export function sealAnswer(text: string, key: string): string {
  const iv = randomBytes(IV_BYTES);
  const cipher = createCipheriv(CIPHER, cipherKey(key), iv);
  const body = Buffer.concat([cipher.update(text, 'utf8'), cipher.final()]);
  return Buffer.concat([iv, cipher.getAuthTag(), body]).toString('base64');
}

/** @throws Error when the key is another or the text was changed */
export function openAnswer(sealed: string, key: string): string {
  const bytes = Buffer.from(sealed, 'base64');
  const decipher = createDecipheriv(CIPHER, cipherKey(key), bytes.subarray(0, IV_BYTES));
  decipher.setAuthTag(bytes.subarray(IV_BYTES, IV_BYTES + TAG_BYTES));
  return (
    decipher.update(bytes.subarray(IV_BYTES + TAG_BYTES), undefined, 'utf8') +
    decipher.final('utf8')
  );
}
