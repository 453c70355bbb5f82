import type { ReworkNoteView } from '../../../../shared/contracts/fit-reports.ts';
import { formatDifference, formatLength, type LengthUnit } from '../../../../shared/units/length.ts';
import { MeasureRow, MeasureTable } from '../../../components/ui/measure-table.tsx';
import { Sheet } from '../../../components/ui/sheet.tsx';
import { Stamp } from '../../../components/ui/stamp.tsx';
import type { Tone } from '../../../components/ui/tone.ts';
import { formatMinor } from '../../../../shared/units/money.ts';
import { shortInstant } from '../../../lib/today.ts';

const STATES: Readonly<Record<ReworkNoteView['state'], { words: string; tone: Tone }>> = {
  offered: { words: 'Offered', tone: 'brass' },
  agreed: { words: 'Agreed', tone: 'verdigris' },
  'other-limits-asked': { words: 'Sent back', tone: 'neutral' },
  done: { words: 'Done', tone: 'verdigris' },
};

const CONSENT: Readonly<Record<'asked' | 'given' | 'refused', { words: string; tone: Tone }>> = {
  asked: { words: 'Client asked', tone: 'brass' },
  given: { words: 'Client consents', tone: 'verdigris' },
  refused: { words: 'Client refuses', tone: 'oxide' },
};

/** One rework note as its readers see it. */
export function NoteSheet({
  note,
  nameOf,
  sideNames,
  unit,
}: {
  note: ReworkNoteView;
  nameOf: (partyId: string) => string;
  sideNames: { hole: string; shaft: string };
  unit: LengthUnit;
}) {
  return (
    <Sheet
      title="Rework note"
      note={`from ${nameOf(note.partyId)}, ${note.authorName}, ${shortInstant(note.at)}`}
      stamp={
        <span className="flex flex-wrap gap-2">
          {note.consent && <Stamp tone={CONSENT[note.consent.state].tone}>{CONSENT[note.consent.state].words}</Stamp>}
          <Stamp tone={STATES[note.state].tone}>{STATES[note.state].words}</Stamp>
        </span>
      }
    >
      <p className="max-w-words pb-3 whitespace-pre-line">{note.method}</p>
      <MeasureTable caption="What comes off">
        <MeasureRow
          emphasised
          label={`Off the ${sideNames[note.cutSide]}, on diameter`}
          value={formatDifference(note.removeOnDiameterUm, unit)}
        />
        <MeasureRow label="per side" value={formatDifference(note.removeOnDiameterUm / 2, unit, 4)} />
        {note.overLengthMm !== null && <MeasureRow label="over" value={formatLength(note.overLengthMm, unit)} />}
        <MeasureRow label="Shows when closed" value={note.shows ? note.whereItShows : 'no'} />
        <MeasureRow
          label="Cost"
          value={`${formatMinor(note.costMinor, note.currency)}${note.costBorneByPartyId ? `, borne by ${nameOf(note.costBorneByPartyId)}` : ''}`}
        />
        <MeasureRow label="Takes" value={note.effectDays === 1 ? '1 working day' : `${note.effectDays} working days`} />
      </MeasureTable>
      {note.risk && <p className="pt-3 text-note">What could go wrong: {note.risk}</p>}
      {note.consent?.words && <p className="pt-3 text-note">The client: “{note.consent.words}”</p>}
    </Sheet>
  );
}
