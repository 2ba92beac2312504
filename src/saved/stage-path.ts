import { dirname, isAbsolute, join, relative, resolve, sep } from 'node:path';

/**
 * How the path of a stage file is kept. A file below the folder of the catalog is kept relative to it, so that a project folder
 * with its catalog can be moved or shared; any other by its absolute path. Always with forward slashes.
 */
export function keptPath(file: string, catalog: string): string {
  const absolute = resolve(file);
  const below = relative(dirname(resolve(catalog)), absolute);
  return slashed(isInside(below) ? below : absolute);
}

/** Where a kept file is now. */
export function foundPath(kept: string, catalog: string): string {
  return isAbsolute(kept) ? kept : join(dirname(resolve(catalog)), kept);
}

/** How a kept file is shown: relative to the working folder where it lies below it, so that it can be typed as it stands. */
export function shownPath(kept: string, catalog: string, folder: string): string {
  const absolute = foundPath(kept, catalog);
  const below = relative(folder, absolute);
  return slashed(isInside(below) ? below : absolute);
}

const isInside = (below: string): boolean => below !== '' && !isAbsolute(below) && below.split(sep)[0] !== '..';

const slashed = (path: string): string => path.replaceAll(sep, '/');
