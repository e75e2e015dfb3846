import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex, utf8ToBytes } from '@noble/hashes/utils.js';

/** SHA-256 of raw bytes, lower-case hex, 64 characters. Source: FIPS 180-4, by the library @noble/hashes. */
export function digestOfBytes(bytes: Uint8Array): string {
  return bytesToHex(sha256(bytes));
}

/** SHA-256 of the samples' bytes as they stand in memory (IEEE 754 doubles, little endian on every machine we run on). */
export function digestOfSamples(samples: Float64Array): string {
  return digestOfBytes(new Uint8Array(samples.buffer, samples.byteOffset, samples.byteLength));
}

/** SHA-256 of a text in UTF-8: the key of a result is the digest of the JSON of what it was computed from. */
export function digestOfText(text: string): string {
  return digestOfBytes(utf8ToBytes(text));
}
