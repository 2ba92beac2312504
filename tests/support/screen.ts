/** What a terminal shows after it was sent this: the controls a prompt draws with, and endless rows. Colour is left out. */
export function screenOf(sent: string, columns: number): string {
  const screen: Screen = { lines: [[]], row: 0, column: 0, columns };
  for (const [piece] of sent.matchAll(PIECES)) draw(piece, screen);
  return screen.lines.map((line) => Array.from(line, (character) => character ?? ' ').join('').replaceAll('\u00a0', ' ').trimEnd()).join('\n').trimEnd();
}

interface Screen {
  readonly lines: (string | undefined)[][];
  row: number;
  column: number;
  readonly columns: number;
}

const PIECES = /\u001b\[([?\d;]*)([A-Za-z])|\r|\n|\u0007|[\s\S]/gu;
const CONTROL = /^\u001b\[([?\d;]*)([A-Za-z])$/u;

function draw(piece: string, screen: Screen): void {
  const control = CONTROL.exec(piece);
  if (control !== null) return move(control[2] ?? '', control[1] ?? '', screen);
  if (piece === '\r') screen.column = 0;
  else if (piece === '\n') screen.row += 1;
  else if (piece !== '\u0007') put(piece, screen);
}

function put(character: string, screen: Screen): void {
  if (screen.column >= screen.columns) {
    screen.row += 1;
    screen.column = 0;
  }
  lineAt(screen)[screen.column] = character;
  screen.column += 1;
}

function move(letter: string, parameters: string, screen: Screen): void {
  const count = Number(parameters) || 1;
  const moves: Readonly<Record<string, () => void>> = {
    A: () => { screen.row = Math.max(0, screen.row - count); },
    B: () => { screen.row += count; },
    C: () => { screen.column += count; },
    D: () => { screen.column = Math.max(0, screen.column - count); },
    G: () => { screen.column = count - 1; },
    K: () => { lineAt(screen).length = parameters === '2' ? 0 : Math.min(screen.column, lineAt(screen).length); },
    J: () => { screen.lines.length = screen.row + 1; },
    m: () => undefined,
    h: () => undefined,
    l: () => undefined,
  };
  const known = moves[letter];
  if (known === undefined) throw new Error(`the screen does not know the control ${parameters}${letter}`);
  known();
}

function lineAt(screen: Screen): (string | undefined)[] {
  while (screen.lines.length <= screen.row) screen.lines.push([]);
  return screen.lines[screen.row] ?? [];
}
