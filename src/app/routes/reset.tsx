import { AskReset, CompleteReset } from '../../features/account/components/reset-form.tsx';
import { Door } from '../../features/account/components/door.tsx';
import { useLinkToken } from '../use-link-token.ts';

export function Component() {
  const token = useLinkToken();
  return token ? (
    <Door title="Set a new password">
      <CompleteReset token={token} />
    </Door>
  ) : (
    <Door title="Ask for a new password">
      <AskReset />
    </Door>
  );
}
