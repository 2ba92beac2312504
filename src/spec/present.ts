/** Leaves out what was not written: absent and undefined are different to a reader of the stage. */
export function present<T extends object>(fields: T): { [Key in keyof T]: Exclude<T[Key], undefined> } {
  return Object.fromEntries(Object.entries(fields).filter(([, value]) => value !== undefined)) as { [Key in keyof T]: Exclude<T[Key], undefined> };
}
