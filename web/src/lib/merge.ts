const same = (a: unknown, b: unknown) => JSON.stringify(a) === JSON.stringify(b);

/** What `mine` changes against the state it was begun from. */
export function changesOf<T extends object>(base: T, mine: T): Partial<T> {
  const changed = Object.entries(mine).filter(([key, value]) => !same(value, base[key as keyof T]));
  return Object.fromEntries(changed) as Partial<T>;
}

/** Did someone else change, since `base`, any of the things this patch changes? */
export function collide<T extends object>(patch: object, base: T, theirs: T): boolean {
  return Object.keys(patch).some((key) => !same(base[key as keyof T], theirs[key as keyof T]));
}
