/** Something that wants its near edge at a place along a line and takes up some length there. */
export type Wanting = { wanted: number; size: number };

/**
 * Places things along a line in their order, each as near as it can to where it wants to be, none over another and none
 * before `from`; past `to` only when all together do not fit. Neighbours in each other's way share the shift.
 */
export function spread(things: readonly Wanting[], from: number, to: number, gap = 0): number[] {
  // With what stands before each taken away, "not over one another" becomes "never falling": neighbours that would
  // fall are pooled at their mean.
  const pools: { sum: number; count: number }[] = [];
  let before = 0;
  const offsets: number[] = [];
  for (const { wanted, size } of things) {
    offsets.push(before);
    pools.push({ sum: wanted - before, count: 1 });
    before += size + gap;
    for (;;) {
      const last = pools.at(-1);
      const previous = pools.at(-2);
      if (!last || !previous || previous.sum / previous.count <= last.sum / last.count) break;
      previous.sum += last.sum;
      previous.count += last.count;
      pools.pop();
    }
  }
  const room = to - (before - gap);
  const places: number[] = [];
  for (const { sum, count } of pools)
    for (let member = 0; member < count; member += 1)
      places.push(Math.max(from, Math.min(sum / count, room)) + (offsets[places.length] ?? 0));
  return places;
}
