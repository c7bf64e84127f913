/**
 * Orders slots so that each comes after all it depends on (Kahn's algorithm: no recursion, so a chain of 10,000 is no depth).
 * What cannot be ordered lies on a ring or behind one; the rings are named.
 */
export function orderSlots(dependsOn: readonly (readonly number[])[]): { order: number[]; rings: number[][] } {
  const waitsFor = dependsOn.map((each) => each.length);
  const dependants: number[][] = dependsOn.map(() => []);
  dependsOn.forEach((on, slot) => on.forEach((each) => dependants[each]?.push(slot)));
  const order = waitsFor.flatMap((count, slot) => (count === 0 ? [slot] : []));
  // `order` grows while it is walked: it is the queue as well.
  for (let at = 0; at < order.length; at += 1) {
    for (const dependant of dependants[order[at] ?? -1] ?? []) {
      const left = (waitsFor[dependant] ?? 0) - 1;
      waitsFor[dependant] = left;
      if (left === 0) order.push(dependant);
    }
  }
  const stuck = new Set(waitsFor.flatMap((count, slot) => (count > 0 ? [slot] : [])));
  return { order, rings: findRings(stuck, dependsOn) };
}

/** From each stuck slot, follow what it waits for until a slot comes up again: what lies between is a ring. */
function findRings(stuck: ReadonlySet<number>, dependsOn: readonly (readonly number[])[]): number[][] {
  const rings: number[][] = [];
  const walked = new Set<number>();
  for (const start of stuck) {
    const path: number[] = [];
    const placeInPath = new Map<number, number>();
    let at: number | undefined = start;
    while (at !== undefined && !walked.has(at)) {
      walked.add(at);
      placeInPath.set(at, path.length);
      path.push(at);
      at = dependsOn[at]?.find((each) => stuck.has(each));
    }
    const meets = at === undefined ? undefined : placeInPath.get(at);
    if (meets !== undefined) rings.push(path.slice(meets));
  }
  return rings;
}
