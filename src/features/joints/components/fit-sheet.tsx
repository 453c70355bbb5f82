import type { JointView, ReadingView } from '../../../../shared/contracts/joints.ts';
import type { Verdict } from '../../../../shared/engines/fit/clearance.ts';
import { formatDifference, formatLength, formatUm, type LengthUnit } from '../../../../shared/units/length.ts';
import { JointSection } from '../../../components/drawings/joint-section.tsx';
import { ZoneDrawing } from '../../../components/drawings/zone-drawing.tsx';
import { Caution } from '../../../components/ui/caution.tsx';
import { MeasureRow, MeasureTable } from '../../../components/ui/measure-table.tsx';
import { Sheet } from '../../../components/ui/sheet.tsx';
import { Stamp } from '../../../components/ui/stamp.tsx';
import type { Tone } from '../../../components/ui/tone.ts';
import { SIDE_WORDS } from '../../../lib/words.ts';
import { fitOfJoint } from '../fit-of-joint.ts';

const VERDICTS: Readonly<Record<Verdict, { words: string; tone: Tone }>> = {
  conforms: { words: 'conforms', tone: 'verdigris' },
  'does-not-conform': { words: 'does not conform', tone: 'oxide' },
  'cannot-be-decided': { words: 'these readings cannot decide', tone: 'brass' },
};

export interface FitSheetProps {
  joint: JointView;
  readings: readonly ReadingView[];
  unit: LengthUnit;
}

/** A joint's fit: the zones and readings about the zero line, the figures, and what has to come off. */
export function FitSheet({ joint, readings, unit }: FitSheetProps) {
  const { hole, shaft, result, removal } = fitOfJoint(joint, readings);
  const names = SIDE_WORDS[joint.kind];
  const inUnit = (valueUm: number): string => formatDifference(valueUm, unit);
  const verdict = result && VERDICTS[result.verdict];
  const cut = removal !== null && removal.onDiameterUm > 0;
  return (
    <Sheet title={`Joint: ${joint.name}`} stamp={verdict && <Stamp tone={verdict.tone}>{verdict.words}</Stamp>}>
      <ZoneDrawing
        title={joint.name}
        nominalMm={joint.nominalMm}
        nominalInWords={formatLength(joint.nominalMm, unit)}
        hole={{ name: names.hole, agreed: hole.agreed, readingsUm: hole.readingsUm }}
        shaft={{ name: names.shaft, agreed: shaft.agreed, readingsUm: shaft.readingsUm }}
      />
      <MeasureTable
        caption={
          cut
            ? `To reach ${joint.handFit ? `a ${joint.handFit} fit` : 'the agreed clearance'}`
            : 'Clearance on diameter'
        }
      >
        <MeasureRow
          label="Clearance agreed"
          value={`${inUnit(joint.clearanceMinUm)} – ${inUnit(joint.clearanceMaxUm)}`}
        />
        {result && (
          <>
            <MeasureRow
              label="Worst pair now"
              value={inUnit(result.worstPairUm)}
              tone={result.verdict === 'does-not-conform' ? 'oxide' : 'plain'}
            />
            <MeasureRow label="Mean" value={inUnit(result.meanClearanceUm)} />
            <MeasureRow label="Gauge doubt (k = 2)" value={`±${inUnit(result.doubtUm)}`} />
            <MeasureRow label={`Spread of the ${names.hole}`} value={formatUm(result.hole.spreadUm)} />
            <MeasureRow label={`Spread of the ${names.shaft}`} value={formatUm(result.shaft.spreadUm)} />
          </>
        )}
        {cut && (
          <>
            <MeasureRow
              emphasised
              label={`Take off the ${names.shaft}, on diameter`}
              value={inUnit(removal.onDiameterUm)}
            />
            <MeasureRow label="per side" value={formatDifference(removal.perSideUm, unit, 4)} />
            <MeasureRow
              label="least and most that reach the range"
              value={`${inUnit(removal.leastOnDiameterUm)} – ${inUnit(removal.mostOnDiameterUm)}`}
            />
            {joint.hiddenLengthMm !== null && joint.engagementMm !== null && (
              <MeasureRow
                label="over, stopping short of what shows"
                value={`${formatLength(joint.hiddenLengthMm, unit)} of ${formatLength(joint.engagementMm, unit)}`}
              />
            )}
          </>
        )}
      </MeasureTable>
      {!result && (
        <p className="py-3 text-note text-lead-grey">Both sides have to be measured before the fit can be judged.</p>
      )}
      {removal?.spreadTooWide && (
        <p className="py-3 text-note">
          The parts are further from round or straight ({formatUm(removal.thenLoosestPairUm - removal.thenWorstPairUm)}{' '}
          together) than the agreed range is wide. Size alone will leave it loose in places.
        </p>
      )}
      {result && joint.engagementMm !== null && (
        <JointSection
          title={joint.name}
          holeName={names.hole}
          shaftName={names.shaft}
          holeDiameterMm={result.hole.minMm}
          shaftDiameterMm={result.shaft.maxMm}
          engagementMm={joint.engagementMm}
          wallMm={null}
          removal={
            cut
              ? {
                  from: 'shaft',
                  onDiameterMm: removal.onDiameterUm / 1000,
                  overLengthMm: joint.hiddenLengthMm ?? joint.engagementMm,
                }
              : null
          }
          formatLength={(valueMm) => formatLength(valueMm, unit)}
        />
      )}
      {cut && (
        <Caution>
          Thin-walled work in a chuck can grip, crush or let go: support it, wear eye protection, follow the lathe
          maker's instructions and your local rules.
        </Caution>
      )}
    </Sheet>
  );
}
