/**
 * The first loop in a waits-for graph, as the ids along it with the first one again at the end, or null. Depth first with
 * three marks; ids that nothing describes wait for nothing.
 */
export function findLoop(waitsFor: ReadonlyMap<string, readonly string[]>): string[] | null {
  const done = new Set<string>();
  const path: string[] = [];
  const onPath = new Set<string>();

  const visit = (id: string): string[] | null => {
    if (onPath.has(id)) return [...path.slice(path.indexOf(id)), id];
    if (done.has(id)) return null;
    path.push(id);
    onPath.add(id);
    for (const before of waitsFor.get(id) ?? []) {
      const loop = visit(before);
      if (loop) return loop;
    }
    path.pop();
    onPath.delete(id);
    done.add(id);
    return null;
  };

  for (const id of waitsFor.keys()) {
    const loop = visit(id);
    if (loop) return loop;
  }
  return null;
}
