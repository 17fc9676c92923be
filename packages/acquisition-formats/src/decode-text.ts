import type { FaultList } from './fault-list.ts';
import type { ReadingLimits } from './reading-limits.ts';

/**
 * The text of a file. Bytes are read as UTF-8, and as Windows-1252 where they are not valid UTF-8: the standard
 * asks for ASCII, so the two differ only in free text. Returns undefined when there is nothing to read on with.
 */
export function decodeText(file: string | Uint8Array, limits: ReadingLimits, faults: FaultList): string | undefined {
  if (file.length > limits.byteCountMax) {
    const detail = `the file holds ${file.length} bytes; at most ${limits.byteCountMax} are taken`;
    faults.add('file-too-large', detail);
    return undefined;
  }
  const text = typeof file === 'string' ? withoutByteOrderMark(file) : decodeBytes(file);
  if (text.includes('\0')) {
    faults.add('not-text', 'the file holds zero bytes; JCAMP-DX is plain text, so send the exported text file');
    return undefined;
  }
  return text;
}

function decodeBytes(bytes: Uint8Array): string {
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch (cause) {
    // Not valid UTF-8; every byte sequence is valid Windows-1252.
    if (cause instanceof TypeError) return new TextDecoder('windows-1252').decode(bytes);
    throw cause;
  }
}

function withoutByteOrderMark(text: string): string {
  return text.charCodeAt(0) === 0xfeff ? text.slice(1) : text;
}
