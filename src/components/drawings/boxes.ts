/** A rectangle of a drawing in pixels; y grows downwards. */
export interface Box {
  x: number;
  y: number;
  width: number;
  height: number;
}

export const overlaps = (one: Box, other: Box): boolean =>
  one.x < other.x + other.width &&
  other.x < one.x + one.width &&
  one.y < other.y + other.height &&
  other.y < one.y + one.height;

/** The first place that touches nothing drawn; the last one where all are taken. */
export function firstFree(places: readonly [Box, ...Box[]], taken: readonly Box[]): Box {
  return places.find((place) => !taken.some((box) => overlaps(place, box))) ?? (places.at(-1) as Box);
}
