import { crc32, deflateRawSync } from 'node:zlib';

/** A ZIP archive of the given files, as any program would write it. */
export function zipBytes(files: Readonly<Record<string, string>>): Buffer {
  const bodies: Buffer[] = [];
  const directory: Buffer[] = [];
  let offset = 0;
  for (const [name, text] of Object.entries(files)) {
    const content = Buffer.from(text);
    const packed = deflateRawSync(content);
    const fields = Buffer.alloc(26);
    fields.writeUInt16LE(20, 0);
    fields.writeUInt16LE(8, 4);
    fields.writeUInt32LE(crc32(content), 10);
    fields.writeUInt32LE(packed.length, 14);
    fields.writeUInt32LE(content.length, 18);
    fields.writeUInt16LE(Buffer.byteLength(name), 22);
    const local = Buffer.concat([Buffer.from('PK\u0003\u0004'), fields, Buffer.from(name), packed]);
    const tail = Buffer.alloc(14);
    tail.writeUInt32LE(offset, 10);
    directory.push(Buffer.concat([Buffer.from('PK\u0001\u0002\u0014\u0000'), fields, tail, Buffer.from(name)]));
    bodies.push(local);
    offset += local.length;
  }
  const central = Buffer.concat(directory);
  const end = Buffer.alloc(18);
  end.writeUInt16LE(directory.length, 4);
  end.writeUInt16LE(directory.length, 6);
  end.writeUInt32LE(central.length, 8);
  end.writeUInt32LE(offset, 12);
  return Buffer.concat([...bodies, central, Buffer.from('PK\u0005\u0006'), end]);
}

export interface WorkbookParts {
  /** The rows of the first sheet in SpreadsheetML. */
  readonly sheetData: string;
  readonly sharedStrings?: string;
  /** Format codes by id from 164 on, and the format ids of the cell styles in order. */
  readonly formats?: Readonly<Record<number, string>>;
  readonly cellStyles?: readonly number[];
  readonly workbookProperties?: string;
}

const RELATION = 'http://schemas.openxmlformats.org/officeDocument/2006/relationships';
const MAIN = 'xmlns="http://schemas.openxmlformats.org/spreadsheetml/2006/main"';

/** An XLSX workbook of two sheets. The first in order is not the first by file name, nor is its file the first in the archive. */
export function workbookBytes({
  sheetData,
  sharedStrings = '',
  formats = {},
  cellStyles = [0],
  workbookProperties = '',
}: WorkbookParts): Buffer {
  const relations = (list: readonly string[]) =>
    `<Relationships xmlns="http://schemas.openxmlformats.org/package/2006/relationships">${list.join('')}</Relationships>`;
  const relation = (id: string, type: string, target: string) =>
    `<Relationship Id="${id}" Type="${RELATION}/${type}" Target="${target}"/>`;
  return zipBytes({
    'xl/worksheets/sheet1.xml': `<worksheet ${MAIN}><sheetData><row r="1"><c t="inlineStr"><is><t>second</t></is></c></row></sheetData></worksheet>`,
    '_rels/.rels': relations([relation('rId1', 'officeDocument', 'xl/workbook.xml')]),
    'xl/workbook.xml': `<workbook ${MAIN} xmlns:r="${RELATION}">${workbookProperties}<sheets><sheet name="Data" sheetId="2" r:id="rId2"/><sheet name="Notes" sheetId="1" r:id="rId1"/></sheets></workbook>`,
    'xl/_rels/workbook.xml.rels': relations([
      relation('rId1', 'worksheet', 'worksheets/sheet1.xml'),
      relation('rId2', 'worksheet', '/xl/worksheets/sheet2.xml'),
      relation('rId3', 'sharedStrings', 'sharedStrings.xml'),
      relation('rId4', 'styles', 'styles.xml'),
    ]),
    'xl/worksheets/sheet2.xml': `<?xml version="1.0" encoding="UTF-8"?><worksheet ${MAIN}><sheetData>${sheetData}</sheetData></worksheet>`,
    'xl/sharedStrings.xml': `<sst ${MAIN}>${sharedStrings}</sst>`,
    'xl/styles.xml': `<styleSheet ${MAIN}><numFmts>${Object.entries(formats)
      .map(([id, code]) => `<numFmt numFmtId="${id}" formatCode="${code.replaceAll('"', '&quot;')}"/>`)
      .join('')}</numFmts><cellStyleXfs><xf numFmtId="14"/></cellStyleXfs><cellXfs>${cellStyles
      .map((id) => `<xf numFmtId="${id}"/>`)
      .join('')}</cellXfs></styleSheet>`,
  });
}
