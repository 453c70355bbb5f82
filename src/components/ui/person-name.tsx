import { joinClasses } from './join-classes.ts';

/** Names of the tints a shop can be drawn in. */
export type NameTint = 'verdigris' | 'brass' | 'gun-blue' | 'oxide' | 'plum' | 'moss';

export interface PersonNameProps {
  name: string;
  shop?: string;
  /** Draws the shop's mark, a short bar in its tint, before the name; the shop's name says the same. */
  tint?: NameTint;
  className?: string;
}

const MARKS: Record<NameTint, string> = {
  verdigris: 'bg-verdigris',
  brass: 'bg-brass',
  'gun-blue': 'bg-gun-blue',
  oxide: 'bg-oxide',
  plum: 'bg-plum',
  moss: 'bg-moss',
};

/** A person and where they work: "Sefa, Tinder Lane". Words, not faces. */
export function PersonName({ name, shop, tint, className }: PersonNameProps) {
  return (
    <span className={joinClasses('font-semibold', className)}>
      {tint && <span aria-hidden className={joinClasses('mr-1.5 inline-block h-3 w-1 print:hidden', MARKS[tint])} />}
      {shop ? `${name}, ${shop}` : name}
    </span>
  );
}
