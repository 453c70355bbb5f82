import { useSuspenseQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { updateLeg, type LegView } from '../../../../shared/contracts/parts-and-legs.ts';
import { shortDay } from '../../../../shared/units/calendar-day.ts';
import { ConflictSheet } from '../../../components/conflict-sheet.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { EmptyState } from '../../../components/ui/empty-state.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Sheet } from '../../../components/ui/sheet.tsx';
import { Stamp } from '../../../components/ui/stamp.tsx';
import { TextArea } from '../../../components/ui/text-area.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { useContractForm } from '../../../hooks/use-contract-form.ts';
import { useSight } from '../../../hooks/use-membership.ts';
import { usePartyBook } from '../../../hooks/use-party-names.ts';
import { keys } from '../../../lib/query-keys.ts';
import { commissionQueries } from '../../../lib/queries/commissions.ts';
import { LEG_KIND_WORDS } from '../../../lib/words.ts';

const number = (text: string): number => Number(text.trim().replace(',', '.'));

/** Estimates and the shop's own note of a leg, for those who may change them. */
function EditLeg({ commissionId, leg, own }: { commissionId: string; leg: LegView; own: boolean }) {
  const form = useContractForm(updateLeg, {
    name: `leg-${leg.id}`,
    initial: {
      hopeful: String(leg.hopefulDays ?? ''),
      likely: String(leg.likelyDays ?? ''),
      bad: String(leg.badDays ?? ''),
      note: leg.privateNote ?? '',
      revision: leg.revision.toString(),
    },
    toInput: (values) => ({
      params: { commissionId, legId: leg.id },
      body: {
        revision: Number(values.revision),
        hopefulDays: number(values.hopeful),
        likelyDays: number(values.likely),
        badDays: number(values.bad),
        ...(own ? { privateNote: values.note } : {}),
      },
    }),
    stale: () => [keys.legs.list(commissionId), keys.standing.detail(commissionId)],
  });
  const { values, set, errorAt } = form;
  const theirs = form.act.problem?.code === 'stale-revision' ? (form.act.problem.problem.current as LegView) : null;
  const line = (name: 'hopeful' | 'likely' | 'bad' | 'note', label: string, saved: string) => ({
    name,
    label,
    mine: values[name],
    theirs: saved,
    same: values[name] === saved,
    takeTheirs: () => set(name, saved),
  });
  return (
    <form
      className="grid gap-3"
      onSubmit={(event) => {
        event.preventDefault();
        form.submit();
      }}
    >
      <div className="grid grid-cols-3 gap-3">
        <Field label="Hopeful, days" error={errorAt('hopefulDays')}>
          <TextInput
            inputMode="decimal"
            value={values.hopeful}
            onChange={(event) => set('hopeful', event.target.value)}
          />
        </Field>
        <Field label="Likely, days" error={errorAt('likelyDays')}>
          <TextInput
            inputMode="decimal"
            value={values.likely}
            onChange={(event) => set('likely', event.target.value)}
          />
        </Field>
        <Field label="Bad, days" error={errorAt('badDays')}>
          <TextInput inputMode="decimal" value={values.bad} onChange={(event) => set('bad', event.target.value)} />
        </Field>
      </div>
      {own && (
        <Field label="Own note" hint="Seen by your shop alone" optional>
          <TextArea value={values.note} maxLength={2000} onChange={(event) => set('note', event.target.value)} />
        </Field>
      )}
      <div className="flex flex-wrap items-center gap-3">
        <Button type="submit" variant="outline" busy={form.act.pending} disabled={!form.isDraft}>
          Save this leg
        </Button>
        {form.isDraft && <span className="text-note text-lead-grey">draft kept</span>}
      </div>
      {theirs ? (
        <ConflictSheet
          fields={[
            line('hopeful', 'Hopeful', String(theirs.hopefulDays ?? '')),
            line('likely', 'Likely', String(theirs.likelyDays ?? '')),
            line('bad', 'Bad', String(theirs.badDays ?? '')),
            ...(own ? [line('note', 'Own note', theirs.privateNote ?? '')] : []),
          ]}
          onSaveMine={() => {
            form.patch({ revision: theirs.revision.toString() });
            form.act.run({
              params: { commissionId, legId: leg.id },
              body: {
                revision: theirs.revision,
                hopefulDays: number(values.hopeful),
                likelyDays: number(values.likely),
                badDays: number(values.bad),
                ...(own ? { privateNote: values.note } : {}),
              },
            });
          }}
        />
      ) : (
        <ProblemNotice problem={form.act.problem} />
      )}
    </form>
  );
}

const STATE_WORDS: Readonly<Record<LegView['state'], string>> = {
  planned: 'Planned',
  'under-way': 'Under way',
  finished: 'Finished',
  dropped: 'Dropped',
};

const daysOf = (leg: LegView): string =>
  leg.finishedOn
    ? `done ${shortDay(leg.finishedOn)}`
    : leg.startedOn
      ? `since ${shortDay(leg.startedOn)}`
      : leg.plannedStartOn
        ? `not before ${shortDay(leg.plannedStartOn)}`
        : 'no day yet';

/** Legs in their order, what each waits for, and the acts open to the reader. */
export function LegsSheet({ commissionId, actsOf }: { commissionId: string; actsOf: (leg: LegView) => ReactNode }) {
  const { data: legs } = useSuspenseQuery(commissionQueries.legs(commissionId));
  const { mine, roles } = useSight(commissionId);
  const { nameOf } = usePartyBook(commissionId);
  const titles = new Map(legs.map((leg) => [leg.id, leg.title]));
  return (
    <Sheet title="Legs">
      {legs.length === 0 && (
        <EmptyState title="No legs yet">
          Machining, finishing, chassis, wiring, blade, test: each shop's portion of the work, and what it waits for.
        </EmptyState>
      )}
      <ol>
        {legs.map((leg) => (
          <li key={leg.id} className="grid gap-2 border-b border-hairline py-4 last:border-b-0">
            <p className="flex flex-wrap items-center gap-2">
              <span className="font-semibold">{leg.title}</span>
              <Stamp tone={leg.state === 'finished' ? 'verdigris' : leg.state === 'under-way' ? 'brass' : 'neutral'}>
                {STATE_WORDS[leg.state]}
              </Stamp>
              {leg.held && (
                <Stamp tone="oxide">
                  {leg.held.title ? `Held: ${leg.held.title}` : `Held since ${shortDay(leg.held.sinceDay)}`}
                </Stamp>
              )}
            </p>
            <p className="text-note text-lead-grey">
              {nameOf(leg.partyId)}, {LEG_KIND_WORDS[leg.kind].toLowerCase()}, {daysOf(leg)}
              {leg.likelyDays !== undefined && (
                <span className="figures">
                  {' '}
                  · {leg.hopefulDays} / {leg.likelyDays} / {leg.badDays} days
                </span>
              )}
              {leg.afterLegIds.length > 0 && ` · waits for ${leg.afterLegIds.map((id) => titles.get(id)).join(', ')}`}
            </p>
            {actsOf(leg)}
            {(mine.has(leg.partyId) || roles.has('lead')) && leg.state !== 'finished' && leg.state !== 'dropped' && (
              <details>
                <summary className="min-h-thumb cursor-pointer py-2 text-note">
                  Change the estimates{mine.has(leg.partyId) && ' or the own note'}
                </summary>
                <EditLeg key={leg.id} commissionId={commissionId} leg={leg} own={mine.has(leg.partyId)} />
              </details>
            )}
          </li>
        ))}
      </ol>
    </Sheet>
  );
}
