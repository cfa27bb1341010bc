const xml = '<?xml version="1.0" encoding="UTF-8" standalone="yes"?>';
const main = 'http://schemas.openxmlformats.org/spreadsheetml/2006/main';
const documents = 'http://schemas.openxmlformats.org/officeDocument/2006/relationships';
const packages = 'http://schemas.openxmlformats.org/package/2006';
const types = 'application/vnd.openxmlformats-officedocument.spreadsheetml';

/** All of a workbook but its one sheet (ECMA-376 part 1, 12.3; part 2 for the package). */
export const bookParts: Readonly<Record<string, string>> = {
  '[Content_Types].xml':
    `${xml}<Types xmlns="${packages}/content-types">` +
    '<Default Extension="rels" ContentType="application/vnd.openxmlformats-package.relationships+xml"/>' +
    '<Default Extension="xml" ContentType="application/xml"/>' +
    `<Override PartName="/xl/workbook.xml" ContentType="${types}.sheet.main+xml"/>` +
    `<Override PartName="/xl/styles.xml" ContentType="${types}.styles+xml"/>` +
    `<Override PartName="/xl/worksheets/sheet1.xml" ContentType="${types}.worksheet+xml"/></Types>`,
  '_rels/.rels':
    `${xml}<Relationships xmlns="${packages}/relationships">` +
    `<Relationship Id="rId1" Type="${documents}/officeDocument" Target="xl/workbook.xml"/>` +
    '</Relationships>',
  'xl/workbook.xml':
    `${xml}<workbook xmlns="${main}" xmlns:r="${documents}"><sheets>` +
    '<sheet name="Sheet1" sheetId="1" r:id="rId1"/></sheets></workbook>',
  'xl/_rels/workbook.xml.rels':
    `${xml}<Relationships xmlns="${packages}/relationships">` +
    `<Relationship Id="rId1" Type="${documents}/worksheet" Target="worksheets/sheet1.xml"/>` +
    `<Relationship Id="rId2" Type="${documents}/styles" Target="styles.xml"/></Relationships>`,
  // Cell formats: plain, bold, date, date with time.
  'xl/styles.xml':
    `${xml}<styleSheet xmlns="${main}">` +
    '<numFmts count="2"><numFmt numFmtId="164" formatCode="yyyy\\-mm\\-dd"/>' +
    '<numFmt numFmtId="165" formatCode="yyyy\\-mm\\-dd\\ hh:mm"/></numFmts>' +
    '<fonts count="2"><font/><font><b/></font></fonts>' +
    '<fills count="2"><fill><patternFill patternType="none"/></fill>' +
    '<fill><patternFill patternType="gray125"/></fill></fills>' +
    '<borders count="1"><border/></borders><cellStyleXfs count="1"><xf/></cellStyleXfs>' +
    '<cellXfs count="4"><xf/><xf fontId="1" applyFont="1"/>' +
    '<xf numFmtId="164" applyNumberFormat="1"/><xf numFmtId="165" applyNumberFormat="1"/>' +
    '</cellXfs></styleSheet>',
};
