import { crc32 } from 'node:zlib';

/** A cell: text, number, date (serial number shown as a date), truth value, or nothing. */
export type WorkbookCell = string | number | boolean | Date | null;

/** Sheets by name, each a table from A1. */
export type WorkbookSheets = Readonly<Record<string, readonly (readonly WorkbookCell[])[]>>;

/** The bytes of a workbook as a spreadsheet saves it (ECMA-376, Office Open XML File Formats, part 1), in a zip without compression. */
export function workbookBytes(sheets: WorkbookSheets): Uint8Array {
  const names = Object.keys(sheets);
  const files: [string, string][] = [
    ['[Content_Types].xml', contentTypes(names.length)],
    ['_rels/.rels', relationships([['officeDocument', 'xl/workbook.xml']])],
    ['xl/workbook.xml', `${XML}<workbook xmlns="${MAIN}" xmlns:r="${OFFICE}"><sheets>${names.map((name, at) => `<sheet name="${escaped(name)}" sheetId="${at + 1}" r:id="rId${at + 1}"/>`).join('')}</sheets></workbook>`],
    ['xl/_rels/workbook.xml.rels', relationships([...names.map((_, at): [string, string] => ['worksheet', `worksheets/sheet${at + 1}.xml`]), ['styles', 'styles.xml']])],
    ['xl/styles.xml', `${XML}<styleSheet xmlns="${MAIN}"><cellXfs count="2"><xf numFmtId="0"/><xf numFmtId="14" applyNumberFormat="1"/></cellXfs></styleSheet>`],
    ...names.map((name, at): [string, string] => [`xl/worksheets/sheet${at + 1}.xml`, sheetXml(sheets[name] ?? [])]),
  ];
  return zipped(files.map(([name, text]) => [name, Buffer.from(text, 'utf8')]));
}

const XML = '<?xml version="1.0" encoding="UTF-8" standalone="yes"?>';
const MAIN = 'http://schemas.openxmlformats.org/spreadsheetml/2006/main';
const OFFICE = 'http://schemas.openxmlformats.org/officeDocument/2006/relationships';
const PACKAGE = 'http://schemas.openxmlformats.org/package/2006';

const escaped = (text: string): string => text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('"', '&quot;');

function contentTypes(count: number): string {
  const kind = 'application/vnd.openxmlformats-officedocument.spreadsheetml';
  const sheets = Array.from({ length: count }, (_, at) => `<Override PartName="/xl/worksheets/sheet${at + 1}.xml" ContentType="${kind}.worksheet+xml"/>`);
  return `${XML}<Types xmlns="${PACKAGE}/content-types"><Default Extension="rels" ContentType="application/vnd.openxmlformats-package.relationships+xml"/><Override PartName="/xl/workbook.xml" ContentType="${kind}.sheet.main+xml"/><Override PartName="/xl/styles.xml" ContentType="${kind}.styles+xml"/>${sheets.join('')}</Types>`;
}

function relationships(targets: readonly (readonly [string, string])[]): string {
  return `${XML}<Relationships xmlns="${PACKAGE}/relationships">${targets.map(([kind, target], at) => `<Relationship Id="rId${at + 1}" Type="${OFFICE}/${kind}" Target="${target}"/>`).join('')}</Relationships>`;
}

function sheetXml(rows: readonly (readonly WorkbookCell[])[]): string {
  const cells = (row: readonly WorkbookCell[], at: number): string => row.map((cell, column) => cellXml(cell, `${letterOf(column)}${at + 1}`)).join('');
  return `${XML}<worksheet xmlns="${MAIN}"><sheetData>${rows.map((row, at) => `<row r="${at + 1}">${cells(row, at)}</row>`).join('')}</sheetData></worksheet>`;
}

const letterOf = (column: number): string => (column < 26 ? '' : letterOf(Math.floor(column / 26) - 1)) + String.fromCharCode(65 + (column % 26));

function cellXml(cell: WorkbookCell, at: string): string {
  if (cell === null) return '';
  if (typeof cell === 'string') return `<c r="${at}" t="inlineStr"><is><t xml:space="preserve">${escaped(cell)}</t></is></c>`;
  if (typeof cell === 'boolean') return `<c r="${at}" t="b"><v>${cell ? 1 : 0}</v></c>`;
  if (typeof cell === 'number') return `<c r="${at}"><v>${cell}</v></c>`;
  // Days since 1899-12-30, as spreadsheets count.
  return `<c r="${at}" s="1"><v>${(cell.getTime() - Date.UTC(1899, 11, 30)) / 86_400_000}</v></c>`;
}

/** A zip archive of stored files (PKWARE, APPNOTE.TXT, 4.3). */
function zipped(files: readonly (readonly [string, Buffer])[]): Uint8Array {
  const local: Buffer[] = [];
  const central: Buffer[] = [];
  let at = 0;
  for (const [name, data] of files) {
    const common = Buffer.alloc(26);
    common.writeUInt16LE(20, 0);
    common.writeUInt32LE(crc32(data), 10);
    common.writeUInt32LE(data.length, 14);
    common.writeUInt32LE(data.length, 18);
    common.writeUInt16LE(Buffer.byteLength(name), 22);
    const entry = Buffer.concat([Buffer.from('PK\u0003\u0004'), common, Buffer.from(name), data]);
    const tail = Buffer.alloc(14);
    tail.writeUInt32LE(at, 10);
    central.push(Buffer.concat([Buffer.from('PK\u0001\u0002\u0014\u0000'), common, tail, Buffer.from(name)]));
    local.push(entry);
    at += entry.length;
  }
  const directory = Buffer.concat(central);
  const end = Buffer.alloc(18);
  end.writeUInt16LE(files.length, 4);
  end.writeUInt16LE(files.length, 6);
  end.writeUInt32LE(directory.length, 8);
  end.writeUInt32LE(at, 12);
  return Buffer.concat([...local, directory, Buffer.from('PK\u0005\u0006'), end]);
}
