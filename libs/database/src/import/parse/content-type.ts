/** Openings of files that people upload by mistake, and what each is called in a sentence. */
const OPENINGS: readonly (readonly [bytes: readonly number[] | string, name: string])[] = [
  ['%PDF', 'a PDF document'],
  [[0xd0, 0xcf, 0x11, 0xe0], 'an old Excel workbook (.xls) or one that is locked with a password'],
  [[0x1f, 0x8b], 'a gzip archive'],
  [[0x37, 0x7a, 0xbc, 0xaf], 'a 7z archive'],
  ['Rar!', 'a RAR archive'],
  [[0x89, 0x50, 0x4e, 0x47], 'a PNG picture'],
  [[0xff, 0xd8, 0xff], 'a JPEG picture'],
  ['GIF8', 'a GIF picture'],
  [[0xff, 0xfe], 'text in UTF-16, not UTF-8'],
  [[0xfe, 0xff], 'text in UTF-16, not UTF-8'],
  ['PK\u0003\u0004', 'a ZIP archive or an Excel workbook'],
  ['PK\u0005\u0006', 'an empty ZIP archive'],
];

/** How many bytes from the start {@link contentType} wants to see. */
export const SNIFFED_BYTES = 512;

/** What a file's first bytes say that it is, as words for a sentence; null when they could begin a CSV file. */
export function contentType(start: Uint8Array): string | null {
  for (const [opening, name] of OPENINGS) {
    const bytes = typeof opening === 'string' ? Buffer.from(opening, 'latin1') : Buffer.from(opening);
    if (Buffer.from(start.subarray(0, bytes.length)).equals(bytes)) return name;
  }
  const text = Buffer.from(start.subarray(0, SNIFFED_BYTES)).toString('latin1').trimStart().toLowerCase();
  if (/^(\u00ef\u00bb\u00bf)?<(!doctype|html|\?xml)/.test(text)) return 'a web page or an XML document';
  return null;
}

/** Whether the first bytes are those of a ZIP archive that holds something, as every XLSX workbook is. */
export const isZip = (start: Uint8Array): boolean =>
  start[0] === 0x50 && start[1] === 0x4b && start[2] === 0x03 && start[3] === 0x04;
