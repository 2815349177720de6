/** Things by a key, in the order they were given. (`Map.groupBy` is not in Node 20.) */
export function groupBy<Key, Thing>(things: Thing[], keyOf: (thing: Thing) => Key): Map<Key, Thing[]> {
  const groups = new Map<Key, Thing[]>();
  for (const thing of things) {
    const key = keyOf(thing);
    const group = groups.get(key);
    if (group) group.push(thing);
    else groups.set(key, [thing]);
  }
  return groups;
}
