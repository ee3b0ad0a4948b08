import { describe, expect, test } from 'vitest';
import { WorksheetRecord } from '../contract/worksheet.js';
import { runWorksheet } from './worksheet.js';
import { worksheetOfLink } from './worksheet-link.js';

describe('the worksheet of a link', () => {
  test.each([
    '/worksheets/shim?v=1&gap=1.5&tolerance=0.05',
    ' https://shimlore.example/worksheets/shim?v=1&gap=1,5&tolerance=0.05 ',
  ])('%s is read, run, and comes out the same when it is run again', (link) => {
    const read = worksheetOfLink(link);
    if (!('record' in read)) throw new Error(read.refusal);
    expect(WorksheetRecord.safeParse(read.record).success).toBe(true);
    expect(read.record.inputs).toMatchObject({ gap: 1.5, tolerance: 0.05, mostPieces: 3 });
    expect(runWorksheet(read.record).differs).toBe(false);
  });

  test.each([
    ['another page', '/parts/tarn-m1', 'not the link of a worksheet'],
    ['no link at all', 'http://', 'not a link'],
    ['another version', '/worksheets/shim?v=9&gap=1.5', 'another version'],
    ['a word for a figure', '/worksheets/shim?v=1&gap=wide', 'hold no number: gap'],
    ['nothing filled in', '/worksheets/seat?v=1', 'no result yet'],
  ])('%s is refused with the reason', (_, link, reason) => {
    expect(worksheetOfLink(link)).toEqual({ refusal: expect.stringContaining(reason) });
  });
});
