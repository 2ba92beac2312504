import * as z from 'zod';

/** One thing that is wrong with what the user gave. */
export const problem = z
  .strictObject({
    code: z.string().regex(/^[A-Z]\d{3}$/u).describe('Stable; railfit help CODE has a page on it'),
    severity: z.enum(['error', 'warning']),
    file: z.string().optional(),
    path: z.string().optional().describe('Field of the stage file (signal.input) or option (--supply)'),
    line: z.int().min(1).optional().describe('Physical line, from 1'),
    row: z.int().min(1).optional().describe('Record of a list, the header being row 1'),
    column: z.string().optional().describe('Letter of the column, as a spreadsheet shows it'),
    columnNumber: z.int().min(1).optional().describe('Column from 1: of a list, or of a line of the stage file'),
    header: z.string().optional(),
    part: z.string().optional(),
    value: z.string().optional().describe('The text as typed'),
    span: z.tuple([z.int().min(0), z.int().min(0)]).optional().describe('The part of value that is meant: from, to (exclusive), in UTF-16 units'),
    reason: z.string().describe('What is wrong'),
    fix: z.string().optional().describe('Something to paste in its place'),
    at: z.string().optional().describe('The cell, RFC 7111: approved.csv#cell=3,2'),
  })
  .meta({ id: 'problem', title: 'Problem', description: 'What is wrong, where, why, and what to type instead; fields that do not apply are left out' });
