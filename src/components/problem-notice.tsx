import type { ApiProblem } from '../lib/api.ts';
import { Notice } from './ui/notice.tsx';

/** A refusal in words: what happened, what was kept, and each value that needs attention. */
export function ProblemNotice({ problem }: { problem: ApiProblem | null }) {
  if (!problem) return null;
  const { title, detail, errors } = problem.problem;
  return (
    <Notice kind="alert" tone="oxide" title={title}>
      {detail && <p>{detail}</p>}
      {errors && (
        <ul className="list-disc pl-5">
          {errors.map((error) => (
            <li key={error.pointer + error.message}>{error.message}</li>
          ))}
        </ul>
      )}
    </Notice>
  );
}
