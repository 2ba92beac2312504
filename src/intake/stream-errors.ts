import type { RefusedList } from './list.js';

/** A list that cannot be read row by row: what is told about it needs all of it at once. Nothing is wrong yet. */
export class NeedsWhole extends Error {
  constructor() {
    super('the list has to be read as a whole');
    this.name = 'NeedsWhole';
  }
}

/** What was read row by row is refused; thrown when everything that is wrong is known. */
export class ListRefused extends Error {
  readonly list: RefusedList;

  constructor(list: RefusedList) {
    super(`${list.file} is refused`);
    this.name = 'ListRefused';
    this.list = list;
  }
}
