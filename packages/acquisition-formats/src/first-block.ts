import type { FaultList } from './fault-list.ts';
import type { LabelledRecord } from './labelled-records.ts';
import { recordValue } from './record-sheet.ts';

/**
 * The records of the one block a file may hold, from TITLE to END. Files of several blocks, nested or in a
 * row, are refused: which of them was meant cannot be known. Returns undefined when reading on is pointless.
 */
export function firstBlock(
  text: string,
  records: readonly LabelledRecord[],
  faults: FaultList,
): readonly LabelledRecord[] | undefined {
  if (faults.has('not-jcamp-dx')) return undefined;
  const labelled = records.filter((record) => record.label !== '');
  const [title] = labelled;
  if (title === undefined || title.label !== 'TITLE') {
    const line = title?.line ?? 1;
    faults.add('not-jcamp-dx', 'the first label is not ##TITLE=; is the file complete, and is it JCAMP-DX?', { line });
    return undefined;
  }
  const second = labelled.find((record, index) => index > 0 && record.label === 'TITLE');
  const isLink = labelled.some((record) => record.label === 'DATATYPE' && isLinkType(recordValue(text, record)));
  if (second !== undefined || isLink) {
    const detail = 'the file holds several blocks; send each acquisition as a file of its own';
    faults.add('compound-file', detail, { line: second?.line ?? title.line });
    return undefined;
  }
  return untilEnd(text, labelled, faults);
}

function isLinkType(dataType: string): boolean {
  return dataType.toUpperCase() === 'LINK';
}

function untilEnd(text: string, records: readonly LabelledRecord[], faults: FaultList): readonly LabelledRecord[] {
  const endIndex = records.findIndex((record) => record.label === 'END');
  const end = records[endIndex];
  if (end === undefined) {
    const detail = 'the file has no ##END=; it seems to be cut off, so send it again whole';
    faults.add('missing-end', detail, { line: records[records.length - 1]?.line ?? 1 });
    return records;
  }
  if (endIndex + 1 < records.length || recordValue(text, end) !== '') {
    faults.add('content-after-end', 'something follows ##END=; take it out', { line: end.line });
  }
  return records.slice(0, endIndex);
}
