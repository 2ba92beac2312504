/**
 * A list whose members are made when they are first asked for, and then kept. Whoever cuts a long list to what is shown pays for what is
 * shown; whoever goes through all of it gets all of it.
 */
export function lazyList<Member>(length: number, make: (at: number) => Member): readonly Member[] {
  const made: Member[] = [];
  const memberAt = (at: number): Member => (at in made ? (made[at] as Member) : (made[at] = make(at)));
  const isPlace = (key: string | symbol): key is string => typeof key === 'string' && /^\d+$/u.test(key) && Number(key) < length;
  return new Proxy<Member[]>([], {
    get(target, key, receiver): unknown {
      if (key === 'length') return length;
      return isPlace(key) ? memberAt(Number(key)) : Reflect.get(target, key, receiver);
    },
    has: (target, key) => isPlace(key) || Reflect.has(target, key),
    set: () => false,
  });
}
