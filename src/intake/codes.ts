/** What a code of the import means, why it stops (or does not stop) a list, and what to do. */
export interface CodePage {
  readonly title: string;
  readonly why: string;
  readonly example: string;
  readonly fix: string;
}

const page = (...[title, why, example, fix]: [string, string, string, string]): CodePage => ({ title, why, example, fix });

/** Every code an import can report beside those of quantities (Q…). I1xx file, I2xx headers, I3xx structure, I4xx ids, I5xx cells, I6xx cross-checks; I7xx are the guards of the command. */
export const INTAKE_CODES: Readonly<Record<string, CodePage>> = {
  I101: page('no encoding that is read', 'A list is UTF-8, UTF-16 with its mark, or Windows-1252; these bytes are none of them.', 'byte 0x81 at offset 14', 'Save the file as "CSV UTF-8", or name it: --encoding windows-1252.'),
  I102: page('UTF-16 without its mark, or not a text', 'A NUL byte is in no UTF-8 text, and without the mark UTF-16 would be a guess.', 'a file with every second byte 00', '--encoding utf-16le, or save the file as "CSV UTF-8".'),
  I103: page('empty file', 'There is no header.', 'a file of 0 bytes', 'Write a header line and one line for each part.'),
  I104: page('no part', 'Importing a list without parts would withdraw every part.', 'id,package and nothing below', 'Add the parts, or take the last import back with --undo.'),
  I105: page('over a limit of size', 'Limits keep a quote that was left open from swallowing the machine.', 'a cell of 70 000 characters, a file of 70 MB', 'Split the list, close the quote, or lift the limit of size with --large.'),
  I201: page('the same field twice', 'Two columns would decide one figure, and one would win silently.', 'bias current max (pA), bias current max (nA)', 'Keep one, or name kind and condition of each.'),
  I202: page('the same field in two columns that agree', 'The first is used; the other would win one day.', 'Vos max (mV), Vos max (µV)', 'Drop one column.'),
  I203: page('unknown column', 'It is kept as text and takes part in no check.', 'slew rat min (V/µs)', 'Use the canonical header that is offered, or leave it.'),
  I204: page('header that cannot be read', 'Unit, limit kind or condition do not fit the figure.', 'bias current max (mV)', 'bias current max (pA)'),
  I205: page('value without header', 'A column without a name is not imported.', 'see note, behind the last header', 'Name the column.'),
  I206: page('no id column', 'Every part is told apart by its id.', 'maker part number,package', 'id,package, or --map "COLUMN=id"'),
  I207: page('first line is no header', 'A title block, or group names over the headers. What is proposed is never taken unasked.', 'a line with 1 of 13 cells filled', 'The options that are offered: --header-rows 4-5 --until-blank. They are kept with the mapping.'),
  I208: page('a unit that changed', 'The saved mapping knows the column under another unit, and the figures of the last import do not tell which is right.', 'Iq typ (mA/ch), before Iq typ (µA/ch)', '--map "I=Iq typ (µA/ch)"'),
  I209: page('a column with two readings', 'Only the owner of the list knows which is meant; on a terminal it is asked.', 'VOH @ 2k', '--map "F=output high headroom max (mV) @ 2 kΩ"'),
  I211: page('the footer counts other parts', 'Rows were lost, or the footer is old.', '5 parts, and 4 rows', 'Compare the list with its footer.'),
  I212: page('a mapping that cannot be used', 'It was edited by hand, and a field of it says nothing that is known.', '"railfit:field": "ofset voltage"', '"railfit:field": "offset voltage"'),
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
  I408: page('an id that lost its zeros', 'A spreadsheet takes an id of digits for a number.', '12 among 0011, 0013, 0014', '0012, in a column formatted as text'),
  I501: page('status', 'Without a status a part can be neither offered nor excluded.', 'an empty cell, or aproved', 'approved, conditional, restricted or not-approved'),
  I502: page('text instead of a number', 'It is none of the words for "not known".', 'see DS', 'Leave the cell empty if unknown, or --missing "see DS".'),
  I503: page('a word outside its list', 'Statements are yes or no, the input type is fet or bipolar.', 'maybe', 'yes, no, or empty if unknown'),
  I504: page('below zero', 'The figure is a magnitude.', 'quiescent current of -5 µA', '5 µA'),
  I505: page('impossible zero', 'As a limit it would pass every check.', 'bias current max of 0 pA', 'Leave the cell empty if unknown.'),
  I506: page('price 0', 'It would win every price comparison, and is kept as unknown.', '0', 'Leave the cell empty if unknown.'),
  I507: page('limit kind contradicts the header', 'A typical is never kept as a limit, nor a limit as a typical.', '2 typ under offset voltage max (mV)', 'Move it to a column of its kind.'),
  I508: page('several figures in one cell', 'A canonical column takes one figure.', '2 (5 max)', 'One column each, named min, typ or max.'),
  I509: page('lifecycle', 'Status and lifecycle are different things.', 'retired', 'preliminary, active, nrnd, last-time-buy or obsolete'),
  I510: page('formula instead of a figure', 'What it comes to is not in the file.', '=B2*1000', 'Paste as values before exporting.'),
  I511: page('unknown class', 'Nothing can be borrowed from a class without generic sets.', 'a class that is misspelt', 'Use the class of a generic set, as `railfit part ID` shows it.'),
  I512: page('figures in the wrong order', 'min, typ and max of one figure must not fall.', 'slew rate min 2 and typ 1 V/µs', 'Swap the two, or correct the unit of one.'),
  I513: page('channels', 'A package holds at least one amplifier, and a whole number of them.', '0', '1, 2 or 4; empty if unknown'),
  I514: page('second price', 'The first price column that holds one counts.', 'prices at 1 and at 1000 pieces', 'Keep the quantity the team buys.'),
  I515: page('read with a note', 'The cell has one reading, but is not written the usual way. Told once per column.', '3,3 V', 'Nothing, or write it as the note says.'),
  I516: page('control character in a text', 'It hides what the cell says, and can turn a line around.', 'a text with U+0007 or U+202E', 'Delete the character.'),
  I517: page('absolute maximum below the operating one', 'One of the two is likely wrong.', '5.5 V operating, 5 V absolute', 'Compare both with the datasheet.'),
  I518: page('a figure from two columns', 'One would win silently.', 'Vos typ 1 and Vos typ/max 2/5', 'Keep one, or read the other as text: --map "F=text"'),
  I519: page('lifecycle word in a status column', 'Status and lifecycle are different things: the part keeps the lifecycle and has no approval.', 'NRND under Status', 'A status there, and the lifecycle in a column of its own.'),
  I521: page('a voltage without its point of reference', 'The high end of an input range counts from V+ or from ground at a stated supply.', '3.5', 'V+ - 1.5'),
  I601: page('supply current and bandwidth do not go together', 'Amplifiers give 0.5 to 100 MHz for each mA; outside it one of the two units is likely wrong.', '25 mA for 0.35 MHz', '25 µA'),
  I602: page('a whole column scaled by a power of ten', 'The unit in the header changed and the figures did not, or every figure of the column moved by one power of ten.', 'Iq (mA/ch) over figures in µA', 'Correct the header; if the parts really changed, the option that is offered: --map, or --accept scaled.'),
  I605: page('too few pins', 'One amplifier takes five pins, two take eight, four take fourteen.', '2 channels in SOT-23-5', 'Check package and channels.'),
  I606: page('grade and temperature range do not agree', 'AEC-Q100 grade 0 is -40..150, 1 -40..125, 2 -40..105, 3 -40..85 °C.', 'grade 1 with 0..70 °C', 'Check both.'),
  I607: page('slew rate and bandwidth do not go together', 'Slew rate / (2π·GBW) lies between 20 mV and 20 V for any input stage.', '160 V/s at 0.35 MHz', '160 V/ms'),
  I608: page('far from the rest of its column', 'A thousand or a million times the median, while the other figures lie close together.', '3500 among 1 to 5 mV', '3500 µV'),
};
