/**
 * One choice for every position that matters, cheapest in total first, at most `most` of them. Positions that do not
 * matter keep their first choice. Empty if a position that matters has none.
 */
export function* combinations<T extends { readonly cost: number }>(
  choices: readonly (readonly T[])[],
  mask: number,
  most: number,
): Generator<readonly T[]> {
  const lists = choices.map((list, i) => (mask & (1 << i) ? list : list.slice(0, 1)));
  if (lists.some((list, i) => list.length === 0 && mask & (1 << i))) return;
  const open: { cost: number; picks: number[]; last: number }[] = [
    { cost: lists.reduce((sum, list) => sum + (list[0]?.cost ?? 0), 0), picks: lists.map(() => 0), last: 0 },
  ];
  for (let given = 0; given < most && open.length > 0; given++) {
    let least = 0;
    for (let i = 1; i < open.length; i++) if (open[i]!.cost < open[least]!.cost) least = i;
    const [best] = open.splice(least, 1);
    const { cost, picks, last } = best!;
    yield picks.map((pick, i) => lists[i]![pick]!);
    for (let i = last; i < lists.length; i++) {
      const list = lists[i]!;
      const next = picks[i]! + 1;
      if (next >= list.length) continue;
      const moved = picks.slice();
      moved[i] = next;
      open.push({ cost: cost - list[next - 1]!.cost + list[next]!.cost, picks: moved, last: i });
    }
  }
}
