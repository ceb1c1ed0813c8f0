/** Entries under the key each gives, in order of first appearance (Map.groupBy, which Node 20 does not have yet). */
export function groupBy<T, K>(entries: Iterable<T>, keyOf: (entry: T) => K): Map<K, T[]> {
  const groups = new Map<K, T[]>();
  for (const entry of entries) {
    const key = keyOf(entry);
    const known = groups.get(key);
    if (known) known.push(entry);
    else groups.set(key, [entry]);
  }
  return groups;
}
