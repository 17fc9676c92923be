import type { FaultList } from './fault-list.ts';
import { endOfLine, type LabelledRecord } from './labelled-records.ts';
import type { OrdinateTable } from './ordinate-table.ts';
import type { RecordSheet } from './record-sheet.ts';

/** The two components of a FID, by the symbol of their page. */
export type PageSymbol = 'R' | 'I';

/** Where the ordinates of one component stand, and how many its page says there are. */
export type Page = { readonly table: Omit<OrdinateTable, 'isAffn'>; readonly pointCountText: string | undefined };

const formOf = { '(X++(R..R)),XYDATA': 'R', '(X++(I..I)),XYDATA': 'I' } as const;

/**
 * Find the page of each component: one DATA TABLE each, of the form (X++(R..R)), XYDATA and (X++(I..I)), XYDATA.
 * More pages, two of one component, and other forms are faults.
 */
export function findPages(sheet: RecordSheet, faults: FaultList): ReadonlyMap<PageSymbol, Page> {
  const pages = new Map<PageSymbol, Page>();
  let pointCount: LabelledRecord | undefined;
  for (const record of sheet.records) {
    if (record.label === 'PAGE') pointCount = undefined;
    if (record.label === 'NPOINTS') pointCount = record;
    if (record.label !== 'DATATABLE') continue;
    const form = formLine(sheet.text, record);
    const symbol = formOf[form.written as keyof typeof formOf];
    if (symbol === undefined) {
      const detail = `the data table has the form "${form.written.slice(0, 40)}"; a FID has (X++(R..R)), XYDATA and (X++(I..I)), XYDATA`;
      faults.add('unsupported-table-form', detail, { line: record.line });
    } else if (pages.has(symbol)) {
      faults.add('repeated-page', `there is more than one page of ${symbol}; a FID has one`, { line: record.line });
    } else {
      const table = { text: sheet.text, start: form.end, end: record.valueEnd, line: record.line };
      pages.set(symbol, { table, pointCountText: pointCount && valueLine(sheet.text, pointCount) });
    }
  }
  if (sheet.find('END NTUPLES') === undefined) {
    faults.add('missing-end', 'the block has no ##END NTUPLES=; it seems to be cut off, so send the file again whole');
  }
  for (const symbol of ['R', 'I'] as const) {
    if (!pages.has(symbol)) faults.add('missing-page', `there is no page with the data table of ${symbol}`);
  }
  return pages;
}

/** The form stands on the line of the label: upper case, without blanks and comment. */
function formLine(text: string, record: LabelledRecord): { readonly written: string; readonly end: number } {
  const end = Math.min(endOfLine(text, record.valueStart), record.valueEnd);
  const written = valueLine(text, record).replace(/\s/g, '').toUpperCase();
  return { written, end };
}

function valueLine(text: string, record: LabelledRecord): string {
  const end = Math.min(endOfLine(text, record.valueStart), record.valueEnd);
  const [value = ''] = text.slice(record.valueStart, end).split('$$', 1);
  return value.trim();
}
