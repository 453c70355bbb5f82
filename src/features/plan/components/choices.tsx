import type { PartyView } from '../../../../shared/contracts/commissions.ts';
import type { LegView, PartView } from '../../../../shared/contracts/parts-and-legs.ts';

/** What the forms of a commission's plan choose from. */
export interface PlanChoices {
  commissionId: string;
  parties: readonly PartyView[];
  parts: readonly PartView[];
  legs: readonly LegView[];
}

/** Work is done, and parts are answered for, by shops. */
export const shopsAmong = (parties: readonly PartyView[]): PartyView[] =>
  parties.filter((party) => party.shopId !== null && !party.roles.includes('guest'));

/** Parts are held by those who take part; a guest only looks on. */
export const holdersAmong = (parties: readonly PartyView[]): PartyView[] =>
  parties.filter((party) => !party.roles.includes('guest'));

export const toggled = (list: readonly string[], item: string, on: boolean): string[] =>
  on ? [...list, item] : list.filter((one) => one !== item);

/** Names of records by their ids, for what is shown of a value that is an id. */
export const nameIn =
  (records: readonly { id: string; displayName?: string; name?: string; title?: string }[]) =>
  (id: unknown): string => {
    const found = records.find((record) => record.id === id);
    return found?.displayName ?? found?.name ?? found?.title ?? 'none';
  };

export function PartyOptions({ parties }: { parties: readonly PartyView[] }) {
  return parties.map((party) => (
    <option key={party.id} value={party.id}>
      {party.displayName}
    </option>
  ));
}

export function PartOptions({ parts }: { parts: readonly PartView[] }) {
  return parts.map((part) => (
    <option key={part.id} value={part.id}>
      {part.name}
    </option>
  ));
}

/** The words of a closed list as options. */
export function WordOptions<K extends string>({ words }: { words: Readonly<Record<K, string>> }) {
  return Object.entries<string>(words).map(([value, label]) => (
    <option key={value} value={value}>
      {label}
    </option>
  ));
}
