/** What a code of the import means, why it stops (or does not stop) a list, and what to do. */
export interface CodePage {
  readonly title: string;
  readonly why: string;
  readonly example: string;
  readonly fix: string;
}

const page = (...[title, why, example, fix]: [string, string, string, string]): CodePage => ({ title, why, example, fix });

/** Every code an import can report beside those of quantities (Q…). I1xx file, I2xx headers, I3xx structure, I4xx ids, I5xx cells. */
export const INTAKE_CODES: Readonly<Record<string, CodePage>> = {
  I101: page('not UTF-8', 'A wrong guess of the encoding turns µ and Ω into other letters.', 'byte 0x80 at offset 14', 'Save the file as "CSV UTF-8".'),
  I102: page('UTF-16, or not a text', 'A NUL byte is in no UTF-8 text.', 'a file that starts with FF FE', 'Save the file as "CSV UTF-8".'),
  I103: page('empty file', 'There is no header.', 'a file of 0 bytes', 'Write a header line and one line for each part.'),
  I104: page('no part', 'Importing a list without parts would withdraw every part.', 'id,package and nothing below', 'Add the parts, or take the last import back with --undo.'),
  I105: page('over a limit of size', 'Limits keep a quote that was left open from swallowing the machine.', 'a cell of 70 000 characters', 'Split the list, or close the quote.'),
  I201: page('the same field twice', 'Two columns would decide one figure, and one would win silently.', 'bias current max (pA), bias current max (nA)', 'Keep one, or name kind and condition of each.'),
  I203: page('unknown column', 'It is kept as text and takes part in no check.', 'slew rat min (V/µs)', 'Use the canonical header that is offered, or leave it.'),
  I204: page('header that cannot be read', 'Unit, limit kind or condition do not fit the figure.', 'bias current max (mV)', 'bias current max (pA)'),
  I205: page('value without header', 'A column without a name is not imported.', 'see note, behind the last header', 'Name the column.'),
  I206: page('no id column', 'Every part is told apart by its id.', 'part number,package', 'id,package'),
  I301: page('too many cells', 'A separator that is not quoted moves every later cell by one column.', 'A,Low noise, dual,SO-8', 'A,"Low noise, dual",SO-8'),
  I302: page('too few cells', 'Which cell is missing cannot be known.', 'A,SO-8 under four headers', 'Complete the row; leave a cell empty where nothing is known.'),
  I303: page('quote never closed', 'The rest of the file is inside one cell.', '"50 MHz CMOS,SO-8', '"50 MHz CMOS",SO-8'),
  I304: page('quote inside a cell', 'Inside a cell a quote is doubled and the whole cell is quoted.', '5" reel', '"5"" reel"'),
  I305: page('blank row', 'It is skipped.', ',,,', 'Delete the row.'),
  I306: page('separator that cannot be told', 'Taken for the wrong one, the file would fall into other cells.', 'rows that fit the header neither at commas nor at semicolons', 'Use one separator, and quote a cell or header that holds it.'),
  I401: page('the same row twice', 'It is kept once.', 'two equal rows', 'Delete one.'),
  I402: page('one id, two parts', 'The last row must not win silently.', 'A,SO-8 and A,SC-70-5', 'Keep one of the two rows.'),
  I403: page('ids that differ in case or spaces', 'They are one part written in two ways.', 'org-1 and ORG-1', 'Write both the same way and keep one row.'),
  I404: page('ids that look alike', 'O and 0, I and 1 are easily mistaken.', 'A-O705 and A-0705', 'Check which one is meant.'),
  I405: page('id of a generic set', 'An approved part and a class of parts would have one name. GX- is reserved for generic sets, also those to come.', 'GX-CMOS-1M-RRIO', 'Use another id, and name the set in a class column.'),
  I406: page('no id', 'A part without id cannot be named in an answer.', 'an empty cell under id', 'Write the id the team uses.'),
  I407: page('invisible character in an id', 'The id would be found by nobody who types it.', 'A, zero-width space, B', 'Delete the character.'),
  I501: page('status', 'Without a status a part can be neither offered nor excluded.', 'an empty cell, or aproved', 'approved, conditional, restricted or not-approved'),
  I502: page('text instead of a number', 'It is none of the words for "not known".', 'see DS', 'Leave the cell empty if unknown.'),
  I503: page('a word outside its list', 'Statements are yes or no, the input type is fet or bipolar.', 'maybe', 'yes, no, or empty if unknown'),
  I504: page('below zero', 'The figure is a magnitude.', 'quiescent current of -5 µA', '5 µA'),
  I505: page('impossible zero', 'As a limit it would pass every check.', 'bias current max of 0 pA', 'Leave the cell empty if unknown.'),
  I506: page('price 0', 'It would win every price comparison, and is kept as unknown.', '0', 'Leave the cell empty if unknown.'),
  I507: page('limit kind contradicts the header', 'A typical is never kept as a limit, nor a limit as a typical.', '2 typ under offset voltage max (mV)', 'Move it to a column of its kind.'),
  I508: page('several figures in one cell', 'A canonical column takes one figure.', '2 (5 max)', 'One column each, named min, typ or max.'),
  I509: page('lifecycle', 'Status and lifecycle are different things.', 'retired', 'preliminary, active, nrnd, last-time-buy or obsolete'),
  I511: page('unknown class', 'Nothing can be borrowed from a class without generic sets.', 'a class that is misspelt', 'Use the class of a generic set, as `railfit part ID` shows it.'),
  I512: page('figures in the wrong order', 'min, typ and max of one figure must not fall.', 'slew rate min 2 and typ 1 V/µs', 'Swap the two, or correct the unit of one.'),
  I513: page('channels', 'A package holds at least one amplifier, and a whole number of them.', '0', '1, 2 or 4; empty if unknown'),
  I514: page('second price', 'The first price column that holds one counts.', 'prices at 1 and at 1000 pieces', 'Keep the quantity the team buys.'),
  I515: page('read with a note', 'The cell has one reading, but is not written the usual way. Told once per column.', '3,3 V', 'Nothing, or write it as the note says.'),
  I517: page('absolute maximum below the operating one', 'One of the two is likely wrong.', '5.5 V operating, 5 V absolute', 'Compare both with the datasheet.'),
};
