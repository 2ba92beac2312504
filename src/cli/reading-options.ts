import { Option, type Command } from 'commander';

const collect = (value: string, all: readonly string[] = []): string[] => [...all, value];

/** Options of `import` that answer what only the owner of a list knows. Each can be given again, and is kept with the mapping. */
export function withReadingOptions(command: Command): Command {
  return command
    .option('--map <COLUMN=HEADER>', 'read a column as another header: --map "M=load (kΩ)", or =text', collect)
    .option('--mapping <FILE>', 'the mapping of this list (else beside the catalog, by its headers)')
    .option('--show-mapping', 'how the columns are read, as a CSVW document; nothing is imported')
    .option('--header-rows <ROWS>', 'the row, or the two rows, with the headers: 4-5')
    .option('--until-blank', 'the table ends at the first blank row')
    .option('--sheet <NAME>', 'the sheet of a workbook that holds the list, by name or number')
    .option('--delimiter <CHARACTER>', 'what separates the cells: , ; tab |')
    .addOption(new Option('--decimal <MARK>', 'the decimal mark of the file').choices(['comma', 'point']))
    .option('--encoding <NAME>', 'utf-8, utf-16le, utf-16be, windows-1252')
    .option('--word <WORD=STATUS>', 'an own word of the status column: --word "Preferred=approved"', collect)
    .option('--missing <WORD>', 'an own word for "not known"', collect)
    .option('--declare <WHAT>', 'once for the list: temperature="-40..85 °C", offsetVoltage="25 °C", by=NAME, date=2024-02-17', collect)
    .option('--classes <DISTANCE>', 'apply class proposals within this distance, in decades: 0.3')
    .option('--large', 'lift the limits of size and number of records')
    .option('--no-input', 'never ask');
}
