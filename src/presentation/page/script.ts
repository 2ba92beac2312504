/**
 * The one script of a page: it sorts tables by a column and opens the details for printing. The page reads the same without it.
 * Plain text, so that the content-security policy can name it by its hash.
 */
export const SCRIPT = `'use strict';
(() => {
  const say = document.getElementById('sorted');
  const key = (row, at) => {
    const cell = row.cells[at];
    return cell === undefined ? '' : cell.dataset.order !== undefined ? Number(cell.dataset.order) : cell.textContent.trim();
  };
  const compare = (a, b) => {
    if (typeof a === 'number' && typeof b === 'number') return a - b;
    if (typeof a === 'number') return -1;
    if (typeof b === 'number') return 1;
    return a < b ? -1 : a > b ? 1 : 0;
  };
  for (const table of document.querySelectorAll('table')) {
    const body = table.tBodies[0];
    if (body === undefined || body.rows.length < 3) continue;
    const heads = [...table.tHead.rows[0].cells];
    heads.forEach((head, at) => {
      const title = head.textContent;
      if (title === '') return;
      const button = document.createElement('button');
      button.type = 'button';
      button.textContent = title;
      head.replaceChildren(button);
      button.addEventListener('click', () => {
        const down = head.getAttribute('aria-sort') === 'ascending';
        for (const other of heads) other.removeAttribute('aria-sort');
        head.setAttribute('aria-sort', down ? 'descending' : 'ascending');
        const rows = [...body.rows].map((row, place) => ({ row, place, value: key(row, at) }));
        rows.sort((a, b) => (a.value === '' ? 1 : 0) - (b.value === '' ? 1 : 0) || (down ? -1 : 1) * compare(a.value, b.value) || a.place - b.place);
        for (const { row } of rows) body.append(row);
        if (say !== null) say.textContent = 'Sorted by ' + title + (down ? ', descending.' : ', ascending.');
      });
    });
  }
  addEventListener('beforeprint', () => {
    for (const one of document.querySelectorAll('details')) one.open = true;
  });
})();
`;

/** SHA-256 of the script, base 64, as the policy names it; a test holds the two together. */
export const SCRIPT_HASH = 'sha256-hVeUTceFk62Bx2P+4AaFQmW1BdL6QyjDIUzPdNn2Qeg=';
