import { posix } from 'node:path';
import { type CellStyle, styleOf } from './xlsx-cells.js';
import { readPart, type XlsxArchive, type XmlHandlers } from './xlsx-archive.js';
import { UnreadableFile } from './unreadable-file.js';

/** What is needed to read the first sheet. */
export interface XlsxWorkbook {
  readonly sheetPath: string;
  /** Texts that cells refer to by number. */
  readonly texts: readonly string[];
  /** By the number that cells give. */
  readonly styles: readonly CellStyle[];
  /** Days are counted from 1904, as some programs did. */
  readonly isFrom1904: boolean;
}

/** More text than this is not held in memory beside the file itself. */
const MOST_TEXT_CHARACTERS = 64 * 1024 * 1024;

/** Reads what the first sheet depends on, or null when the archive is no workbook. */
export async function readWorkbook(archive: XlsxArchive): Promise<XlsxWorkbook | null> {
  const workbookPath = [...(await relationsOf(archive, '')).values()].find(
    ({ type }) => type === 'officeDocument',
  )?.path;
  if (workbookPath === undefined || !workbookPath.endsWith('.xml') || !archive.parts.has(workbookPath)) return null;
  const relations = await relationsOf(archive, workbookPath);
  const sheetIds: string[] = [];
  let isFrom1904 = false;
  await readPart(archive, workbookPath, {
    open(name, attributes) {
      if (name === 'sheet') sheetIds.push(relationId(attributes));
      if (name === 'workbookPr') isFrom1904 = /^(1|true)$/.test(attributes['date1904'] ?? '');
    },
  });
  const sheets = sheetIds.map((id) => relations.get(id)).filter((relation) => relation?.type === 'worksheet');
  const sheetPath = sheets[0]?.path;
  if (sheetPath === undefined || !archive.parts.has(sheetPath)) return null;
  const pathOf = (type: string) => {
    const path = [...relations.values()].find((relation) => relation.type === type)?.path;
    return path !== undefined && archive.parts.has(path) ? path : null;
  };
  const textsPath = pathOf('sharedStrings');
  const stylesPath = pathOf('styles');
  return {
    sheetPath,
    texts: textsPath === null ? [] : await readTexts(archive, textsPath),
    styles: stylesPath === null ? [] : await readStyles(archive, stylesPath),
    isFrom1904,
  };
}

interface Relation {
  /** The last word of the type's address, which is the same in both flavours of the standard. */
  readonly type: string;
  readonly path: string;
}

/** What a part refers to, by relation id. The empty path stands for the archive as a whole. */
async function relationsOf(archive: XlsxArchive, path: string): Promise<Map<string, Relation>> {
  const folder = posix.dirname(path);
  const relations = new Map<string, Relation>();
  const relationsPath = posix.join(folder, '_rels', `${posix.basename(path)}.rels`);
  if (!archive.parts.has(relationsPath)) return relations;
  await readPart(archive, relationsPath, {
    open(name, { Id, Type, Target }) {
      if (name !== 'Relationship' || Id === undefined || Type === undefined || Target === undefined) return;
      const target = Target.startsWith('/') ? Target.slice(1) : posix.join(folder, Target);
      relations.set(Id, { type: Type.slice(Type.lastIndexOf('/') + 1), path: target });
    },
  });
  return relations;
}

/** The attribute is `r:id`; the prefix is the producer's choice. */
const relationId = (attributes: Readonly<Record<string, string>>): string =>
  Object.entries(attributes).find(([name]) => name.endsWith(':id'))?.[1] ?? '';

async function readTexts(archive: XlsxArchive, path: string): Promise<string[]> {
  const texts: string[] = [];
  let text = '';
  let characters = 0;
  const inside = textCollector((part) => (text += part));
  await readPart(archive, path, {
    open(name) {
      if (name === 'si') text = '';
      inside.open(name, {});
    },
    text: inside.text,
    close(name) {
      inside.close(name);
      if (name !== 'si') return;
      characters += text.length;
      if (characters > MOST_TEXT_CHARACTERS) {
        throw new UnreadableFile('import-too-large', 'The workbook holds too much text; send it as CSV.');
      }
      texts.push(text);
    },
  });
  return texts;
}

/** Gathers the text of `t` elements, which rich text has several of; readings of Japanese words (`rPh`) are not part of it. */
export function textCollector(add: (text: string) => void): Required<XmlHandlers> {
  let isText = false;
  let isReading = false;
  return {
    open: (name) => {
      if (name === 'rPh') isReading = true;
      if (name === 't') isText = true;
    },
    text: (text) => {
      if (isText && !isReading) add(text);
    },
    close: (name) => {
      if (name === 'rPh') isReading = false;
      if (name === 't') isText = false;
    },
  };
}

async function readStyles(archive: XlsxArchive, path: string): Promise<CellStyle[]> {
  const formats = new Map<number, string>();
  const styles: CellStyle[] = [];
  let isCellFormats = false;
  await readPart(archive, path, {
    open(name, attributes) {
      if (name === 'numFmt') formats.set(Number(attributes['numFmtId']), attributes['formatCode'] ?? '');
      if (name === 'cellXfs') isCellFormats = true;
      if (name === 'xf' && isCellFormats) {
        const id = Number(attributes['numFmtId'] ?? 0);
        styles.push(styleOf(id, formats.get(id)));
      }
    },
    close(name) {
      if (name === 'cellXfs') isCellFormats = false;
    },
  });
  return styles;
}
