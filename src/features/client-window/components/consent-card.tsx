import { useState } from 'react';
import { answerConsent, type ConsentView } from '../../../../shared/contracts/fit-reports.ts';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { TextArea } from '../../../components/ui/text-area.tsx';
import { useAct } from '../../../hooks/use-act.ts';
import { useDraft } from '../../../hooks/use-draft.ts';
import { fileAddress } from '../../../lib/files.ts';
import { keys } from '../../../lib/query-keys.ts';

/** One question to the client: what is done, where it will show, yes or no. */
export function ConsentCard({ commissionId, consent }: { commissionId: string; consent: ConsentView }) {
  const [words, setWords, forget] = useDraft(`consent-${consent.noteId}`, '');
  const [refusing, setRefusing] = useState(false);
  const answer = useAct(answerConsent, {
    said: 'Your answer is kept.',
    stale: () => [keys.consents.list(commissionId), keys.standing.detail(commissionId), keys.bench()],
    onDone: forget,
  });
  const params = { commissionId, noteId: consent.noteId };
  return (
    <div className="grid gap-3 border-b border-hairline py-4 last:border-b-0">
      <p>
        {consent.askedBy} asks: {consent.whatIsDone}. <strong>It will show:</strong> {consent.whereItShows}.
      </p>
      {consent.beforeFileIds.length > 0 && (
        <ul className="flex flex-wrap gap-2">
          {consent.beforeFileIds.map((fileId) => (
            <li key={fileId}>
              <a href={fileAddress(commissionId, fileId, 'full')} target="_blank" rel="noreferrer">
                <img
                  src={fileAddress(commissionId, fileId, 'thumb')}
                  alt="How it is before the correction"
                  loading="lazy"
                  className="h-32 w-auto rounded border border-hairline"
                />
              </a>
            </li>
          ))}
        </ul>
      )}
      {consent.state !== 'asked' ? (
        <p className="text-note text-lead-grey">
          You {consent.state === 'given' ? 'consented' : 'refused'}
          {consent.words && `: “${consent.words}”`}.
        </p>
      ) : (
        <>
          {refusing && (
            <Field label="What you would rather have" optional>
              <TextArea value={words} onChange={(event) => setWords(event.target.value)} />
            </Field>
          )}
          <div className="flex flex-wrap gap-2">
            {refusing ? (
              <>
                <Button
                  variant="danger"
                  busy={answer.pending}
                  onClick={() => answer.run({ params, body: { given: false, words } })}
                >
                  Refuse this
                </Button>
                <Button variant="quiet" onClick={() => setRefusing(false)}>
                  Back
                </Button>
              </>
            ) : (
              <>
                <Button busy={answer.pending} onClick={() => answer.run({ params, body: { given: true, words: '' } })}>
                  I consent
                </Button>
                <Button variant="outline" onClick={() => setRefusing(true)}>
                  I would rather not
                </Button>
              </>
            )}
          </div>
        </>
      )}
      <ProblemNotice problem={answer.problem} />
    </div>
  );
}
